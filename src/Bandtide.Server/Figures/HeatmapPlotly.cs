using Plotly.Blazor;
using Plotly.Blazor.ConfigLib;
using Plotly.Blazor.LayoutLib;
using Plotly.Blazor.LayoutLib.HoverLabelLib;
using Plotly.Blazor.LayoutLib.ShapeLib;
using Plotly.Blazor.Traces;
using Plotly.Blazor.Traces.ScatterLib;
using XTypeEnum = Plotly.Blazor.LayoutLib.XAxisLib.TypeEnum;
using YTypeEnum = Plotly.Blazor.LayoutLib.YAxisLib.TypeEnum;

namespace Bandtide.Server.Figures;

/// <summary>Hands a heatmap to Plotly: the cells, marks and sun lines, without margins, to lie exactly over the same parts of the SVG.</summary>
/// <remarks>Labels, scale and hatching stay the server's, so nothing moves when the chart takes over.</remarks>
internal static class HeatmapPlotly
{
    private const string Clear = "rgba(0,0,0,0)";

    // A hover label that does not fit into the chart is not shown at all: a picture of a few rows gets room below.
    private const int HoverLabelHeight = 150;
    private const string CellTemplate = "<b>%{y}</b><br>%{x}<br>%{text}<extra></extra>";

    /// <summary>The heatmap, and over it the dots of few data.</summary>
    public static IList<ITrace> Traces(HeatmapFigure figure, PageInk ink)
    {
        ArgumentNullException.ThrowIfNull(figure);
        ArgumentNullException.ThrowIfNull(ink);
        return [Cells(figure, ink), Dots(figure, ink)];
    }

    /// <summary>Size, axes, sun lines and the look of the hover label.</summary>
    public static Layout Layout(HeatmapFigure figure, PageInk ink)
    {
        ArgumentNullException.ThrowIfNull(figure);
        ArgumentNullException.ThrowIfNull(ink);
        var below = Math.Max(0, HoverLabelHeight - HeatmapGeometry.PlotHeight(figure));
        return new()
        {
            AutoSize = true,
            Height = HeatmapGeometry.PlotHeight(figure) + below,
            Margin = new() { L = 0, R = 0, T = 0, B = below, Pad = 0 },
            PaperBgColor = Clear,
            PlotBgColor = Clear,
            ShowLegend = false,
            DragMode = DragModeEnum.False,
            HoverMode = HoverModeEnum.Closest,
            HoverLabel = new()
            {
                BgColor = ink.Paper,
                BorderColor = ink.Ink,
                Align = AlignEnum.Left,
                NameLength = -1,
                Font = new() { Family = Ink.Typefaces, Size = 14, Color = ink.Ink },
            },
            XAxis = [new() { Type = XTypeEnum.Category, Visible = false, FixedRange = true, Range = [-0.5, 23.5], CategoryArray = [.. Hours(figure)] }],
            YAxis = [new() { Type = YTypeEnum.Category, Visible = false, FixedRange = true, Range = [figure.Rows.Count - 0.5, -0.5], CategoryArray = [.. Bands(figure)] }],
            Shapes = [.. SunLines(figure.Daylight, ink)],
        };
    }

    /// <summary>No tool bar, no link out; follows the page's width.</summary>
    public static Config Config() => new()
    {
        DisplayModeBar = DisplayModeBarEnum.False,
        DisplayLogo = false,
        DoubleClick = DoubleClickEnum.False,
        Responsive = true,
    };

    private static HeatMap Cells(HeatmapFigure figure, PageInk ink)
    {
        var colours = ink.IsDark ? ColourScale.OnDark : ColourScale.OnPaper;
        return new()
        {
            X = [.. Hours(figure)],
            Y = [.. Bands(figure)],
            Z = [.. figure.Rows.Select(row => (object)row.Cells.Select(cell => double.IsNaN(cell.Value) ? null : (object)Math.Round(cell.Value, 6)).ToArray())],
            Text = [.. figure.Rows.Select(row => (object)row.Cells.Select(figure.Describe).ToArray())],
            ZMin = (decimal)figure.Scale.Low,
            ZMax = (decimal)figure.Scale.High,
            ColorScale = colours.Select((colour, step) => new object[] { step / (ColourScale.Steps - 1.0), colour }).ToArray(),
            ShowScale = false,
            YGap = HeatmapGeometry.RowGap,
            ConnectGaps = false,
            HoverOnGaps = true,
            HoverTemplate = CellTemplate,
        };
    }

    private static Scatter Dots(HeatmapFigure figure, PageInk ink)
    {
        var dots = figure.Rows
            .SelectMany(row => row.Cells.Select((cell, hour) => (row, cell, hour)))
            .Where(one => one.cell.State() == CellState.FewData)
            .ToList();
        return new()
        {
            X = [.. dots.Select(dot => FigureWords.HourSpan(dot.hour, figure.Clock))],
            Y = [.. dots.Select(dot => dot.row.Band.Label)],
            Mode = ModeFlag.Markers,
            HoverInfo = HoverInfoFlag.Skip,
            Marker = new()
            {
                Size = 4.4m,
                ColorArray = [.. dots.Select(dot => IsHigh(figure, dot.cell.Value) ? ink.MarkHigh : ink.MarkLow)],
            },
        };
    }

    private static bool IsHigh(HeatmapFigure figure, double value) =>
        double.IsFinite(value) && ColourScale.IsHigh(ColourScale.Step(figure.Scale.Place(value)));

    private static IEnumerable<string> Hours(HeatmapFigure figure) =>
        Enumerable.Range(0, 24).Select(hour => FigureWords.HourSpan(hour, figure.Clock));

    private static IEnumerable<string> Bands(HeatmapFigure figure) => figure.Rows.Select(row => row.Band.Label);

    // A category's middle has its number; the hour's left edge lies half a column before.
    private static IEnumerable<Shape> SunLines(Daylight? daylight, PageInk ink) =>
        from hour in new[] { daylight?.RiseHour, daylight?.SetHour }
        where hour is not null
        from line in new[] { (Colour: ink.Paper, Width: 3.5m), (Colour: ink.Second, Width: 1.5m) }
        select new Shape
        {
            Type = TypeEnum.Line,
            XRef = "x",
            YRef = "paper",
            X0 = hour - 0.5,
            X1 = hour - 0.5,
            Y0 = 0,
            Y1 = 1,
            Line = new() { Color = line.Colour, Width = line.Width },
        };
}
