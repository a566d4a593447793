using System.Globalization;
using System.Text;

namespace Bandtide.Server.Figures;

/// <summary>Draws the cells of a heatmap: hatching where nobody observed, colour where there is a value, a dot where data is thin.</summary>
internal static class HeatmapCellsSvg
{
    /// <summary>Writes the cells, as wide as the space they are in.</summary>
    /// <param name="svg">Where to.</param>
    /// <param name="rows">Rows from top to bottom.</param>
    /// <param name="scale">Colours of the values.</param>
    /// <param name="size">Heights.</param>
    /// <param name="hatch">Identity of the hatching.</param>
    public static void Write(SvgWriter svg, IReadOnlyList<HeatmapRow> rows, ValueScale scale, CellSize size, string hatch)
    {
        Unobserved(svg, rows, size, hatch);
        svg.Add($"""<g class="fig-cells"><svg viewBox="0 0 {HeatmapGeometry.PlotWidth} {rows.Count * size.Row}" width="100%" height="{rows.Count * size.Row}" preserveAspectRatio="none" shape-rendering="crispEdges">""");
        foreach (var (step, path) in Paths(rows, scale, size))
        {
            svg.Add($"""<path class="s{step}" fill="{ColourScale.OnPaper[step]}" d="{path}"/>""");
        }

        svg.AddRaw("</svg>");
        Dots(svg, rows, scale, size);
        svg.AddRaw("</g>");
    }

    private static void Unobserved(SvgWriter svg, IReadOnlyList<HeatmapRow> rows, CellSize size, string hatch)
    {
        for (var row = 0; row < rows.Count; row++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var from = hour;
                while (hour < 24 && rows[row].Cells[hour].State() == CellState.NotObserved)
                {
                    hour++;
                }

                if (hour > from)
                {
                    svg.Add($"""<rect class="fig-unobserved" x="{HeatmapSvg.Percent(from)}%" y="{row * size.Row}" width="{HeatmapSvg.Percent(hour - from)}%" height="{size.Row - size.Gap}" fill="url(#{hatch})"/>""");
                }
            }
        }
    }

    // One path per colour keeps a picture of eight hundred cells near 20 kB.
    private static SortedDictionary<int, StringBuilder> Paths(IReadOnlyList<HeatmapRow> rows, ValueScale scale, CellSize size)
    {
        var paths = new SortedDictionary<int, StringBuilder>();
        for (var row = 0; row < rows.Count; row++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var value = rows[row].Cells[hour].Value;
                if (double.IsNaN(value))
                {
                    continue;
                }

                var step = ColourScale.Step(scale.Place(value));
                if (!paths.TryGetValue(step, out var path))
                {
                    paths.Add(step, path = new());
                }

                path.Append(
                    CultureInfo.InvariantCulture,
                    $"M{hour * HeatmapGeometry.ColumnWidth} {row * size.Row}h{HeatmapGeometry.ColumnWidth}v{size.Row - size.Gap}h-{HeatmapGeometry.ColumnWidth}z");
            }
        }

        return paths;
    }

    private static void Dots(SvgWriter svg, IReadOnlyList<HeatmapRow> rows, ValueScale scale, CellSize size)
    {
        for (var row = 0; row < rows.Count; row++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var cell = rows[row].Cells[hour];
                if (cell.State() != CellState.FewData)
                {
                    continue;
                }

                var isHigh = double.IsFinite(cell.Value) && ColourScale.IsHigh(ColourScale.Step(scale.Place(cell.Value)));
                var (mark, fill) = isHigh ? ("fig-dot-high", Ink.Paper) : ("fig-dot-low", Ink.Black);
                svg.Add($"""<circle class="{mark}" cx="{HeatmapSvg.Percent(hour + 0.5)}%" cy="{(row + 0.5) * size.Row - size.Gap / 2.0}" r="{size.Dot}" fill="{fill}"/>""");
            }
        }
    }
}
