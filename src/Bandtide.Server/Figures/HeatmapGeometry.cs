namespace Bandtide.Server.Figures;

/// <summary>Where the parts of a heatmap lie, in pixels. The style sheet repeats <see cref="LabelWidth"/> for wide and narrow pages.</summary>
internal static class HeatmapGeometry
{
    /// <summary>Width of the row labels with the gap beside them, on paper and wide pages.</summary>
    public const int LabelWidth = 306;

    /// <summary>Gap between row labels and cells.</summary>
    public const int LabelGap = 10;

    /// <summary>Width of a column on paper; on a page columns share what the page is wide.</summary>
    public const int ColumnWidth = 26;

    /// <summary>Height of a row, the gap below its cells included.</summary>
    public const int RowHeight = 20;

    /// <summary>Gap below the cells of a row.</summary>
    public const int RowGap = 1;

    /// <summary>Height above the cells: sunrise, daylight strip and hours.</summary>
    public const int Head = 58;

    /// <summary>Height below the cells: colour scale and marks.</summary>
    public const int Foot = 66;

    /// <summary>Width of the cells on paper.</summary>
    public const int PlotWidth = 24 * ColumnWidth;

    /// <summary>Width of the whole on paper.</summary>
    public const int Width = LabelWidth + PlotWidth;

    /// <summary>Height of the cells.</summary>
    public static int PlotHeight(HeatmapFigure figure) => figure.Rows.Count * RowHeight;

    /// <summary>Height of the whole, without title and caption.</summary>
    public static int Height(HeatmapFigure figure) => Head + PlotHeight(figure) + Foot;
}
