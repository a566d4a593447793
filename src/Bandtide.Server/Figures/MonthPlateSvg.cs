using System.Globalization;

namespace Bandtide.Server.Figures;

/// <summary>Draws one month of a year: cells with a few frequencies and hours, no legend.</summary>
internal static class MonthPlateSvg
{
    private const int LabelWidth = 38;
    private const int PlotWidth = 202;
    private const int Foot = 16;
    private const int LabelledRows = 6;

    /// <summary>The picture inside a page, as wide as the space it is in.</summary>
    /// <param name="plate">The month.</param>
    /// <param name="scale">The year's scale.</param>
    /// <param name="id">Identity on the page.</param>
    public static string RenderInline(MonthPlate plate, ValueScale scale, string id)
    {
        ArgumentNullException.ThrowIfNull(plate);
        var plot = plate.Rows.Count * CellSize.Small.Row;
        var svg = new SvgWriter();
        svg.Add($"""<span class="fig-pair fig-pair-small"><svg class="fig" aria-hidden="true" width="{LabelWidth}" height="{plot + Foot}" font-size="10">""");
        var every = Math.Max(1, (int)Math.Ceiling(plate.Rows.Count / (double)LabelledRows));
        for (var row = every / 2; row < plate.Rows.Count; row += every)
        {
            var kilohertz = (plate.Rows[row].Band.LowHz / 1000.0).ToString("0", CultureInfo.InvariantCulture);
            svg.Add($"""<text class="fig-soft" x="{LabelWidth - 5}" y="{row * CellSize.Small.Row + 6.5}" text-anchor="end" fill="{Ink.Grey}">{kilohertz}</text>""");
        }

        svg.Add($"""</svg><svg class="fig" aria-hidden="true" width="{PlotWidth}" height="{plot + Foot}" font-size="10">""");
        svg.AddRaw(HeatmapSvg.HatchPattern($"hatch-{id}"));
        HeatmapCellsSvg.Write(svg, plate.Rows, scale, CellSize.Small, $"hatch-{id}");
        foreach (var hour in new[] { 0, 6, 12, 18 })
        {
            svg.Add($"""<text class="fig-soft" x="{HeatmapSvg.Percent(hour + 0.5)}%" y="{plot + 12}" text-anchor="middle" fill="{Ink.Grey}">{hour.ToString("00", CultureInfo.InvariantCulture)}</text>""");
        }

        return svg.AddRaw("</svg></span>").ToString();
    }

    /// <summary>The year's colour scale, for below the twelve months.</summary>
    public static string RenderScale(YearFigure figure, string id)
    {
        ArgumentNullException.ThrowIfNull(figure);
        var svg = new SvgWriter();
        svg.Add($"""<svg class="fig fig-foot" aria-hidden="true" width="600" height="52" font-size="12">""");
        svg.AddRaw(HeatmapSvg.HatchPattern($"hatch-{id}"));
        HeatmapLegendSvg.Write(svg, figure.Scale, figure.ScaleTitle, 0, $"hatch-{id}");
        return svg.AddRaw("</svg>").ToString();
    }
}
