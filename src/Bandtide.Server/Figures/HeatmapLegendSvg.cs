namespace Bandtide.Server.Figures;

/// <summary>Draws the colour scale and the marks below a heatmap.</summary>
internal static class HeatmapLegendSvg
{
    private const int StepWidth = 4;
    private const int BarTop = 22;
    private const int BarHeight = 10;
    private const int MarksLeft = 330;

    /// <summary>Writes the legend.</summary>
    /// <param name="svg">Where to.</param>
    /// <param name="scale">The scale.</param>
    /// <param name="title">Its name with the unit.</param>
    /// <param name="top">Lower edge of the cells.</param>
    /// <param name="hatch">Identity of the hatching.</param>
    public static void Write(SvgWriter svg, ValueScale scale, string title, int top, string hatch)
    {
        svg.Add($"""<g class="fig-legend" transform="translate(0,{top})">""");
        WriteScale(svg, scale, title);
        svg.Add($"""<g class="fig-marks" transform="translate({MarksLeft},0)">""");
        svg.Add($"""<rect x="0.5" y="{BarTop - 3.5}" width="26" height="16" fill="url(#{hatch})"/><text x="34" y="{BarTop + 9}">not observed</text>""");
        var pale = ColourScale.Step(0.3);
        svg.Add($"""<rect class="s{pale}" x="126" y="{BarTop - 3.5}" width="26" height="16" fill="{ColourScale.OnPaper[pale]}"/><circle class="fig-dot-low" cx="139" cy="{BarTop + 4.5}" r="2.2" fill="{Ink.Black}"/><text x="160" y="{BarTop + 9}">fewer than {Core.Heatmaps.Heatmap.FewDays} station-days</text>""");
        svg.AddRaw("</g></g>");
    }

    private static void WriteScale(SvgWriter svg, ValueScale scale, string title)
    {
        svg.Add($"""<text class="fig-soft" y="{BarTop - 6}" fill="{Ink.Grey}">{title}</text>""");
        for (var step = 0; step < ColourScale.Steps; step++)
        {
            svg.Add($"""<rect class="s{step}" x="{step * StepWidth}" y="{BarTop}" width="{StepWidth}" height="{BarHeight}" fill="{ColourScale.OnPaper[step]}" shape-rendering="crispEdges"/>""");
        }

        foreach (var tick in scale.Ticks)
        {
            var x = scale.Place(tick) * ColourScale.Steps * StepWidth;
            var anchor = tick == scale.Low ? "start" : tick == scale.High ? "end" : "middle";
            svg.Add($"""<path class="fig-frame" d="M{x} {BarTop + BarHeight}v4" stroke="{Ink.Black}" stroke-width="0.75"/><text class="fig-tick" x="{x}" y="{BarTop + BarHeight + 15}" text-anchor="{anchor}" font-size="11">{scale.Tick(tick)}</text>""");
        }
    }
}
