using System.Text;

namespace Bandtide.Server.Figures;

/// <summary>Draws a heatmap as SVG: the first paint of a page, print, pages without script, the API's picture and the download.</summary>
/// <remarks>
/// Everything across the columns is placed in per cent of the cells' width, so that on a page the same markup fits any width
/// without shrinking its letters.
/// </remarks>
internal static class HeatmapSvg
{
    private const int TitleHeight = 74;
    private const int CaptionLine = 17;
    private const int CaptionCharacters = 138;
    private const int Margin = 24;

    /// <summary>The picture that stands alone: title, caption and paper of its own, light whatever the reader's setting.</summary>
    /// <param name="figure">The description.</param>
    public static string Render(HeatmapFigure figure)
    {
        ArgumentNullException.ThrowIfNull(figure);
        var caption = figure.Caption.SelectMany(Wrap).ToList();
        var body = figure.Rows.Count == 0 ? 0 : HeatmapGeometry.Height(figure);
        var (width, height) = (HeatmapGeometry.Width + 2 * Margin, TitleHeight + body + caption.Count * CaptionLine + Margin);
        var svg = new SvgWriter();
        svg.Add($"""<svg xmlns="http://www.w3.org/2000/svg" role="img" width="{width}" height="{height}" viewBox="0 0 {width} {height}" font-family="{Ink.Typefaces}" font-size="12" fill="{Ink.Black}">""");
        svg.Add($"<title>{figure.Title}: {figure.Subtitle}</title><desc>{string.Join(' ', figure.Caption)}</desc>");
        svg.Add($"""<rect width="{width}" height="{height}" fill="{Ink.Paper}"/><text x="{Margin}" y="36" font-size="22">{figure.Title}</text><text x="{Margin}" y="58" font-size="14">{figure.Subtitle}</text>""");
        if (figure.Rows.Count > 0)
        {
            svg.Add($"""<g transform="translate({Margin},{TitleHeight})">""");
            Body(svg, figure, "hatch-alone");
            svg.AddRaw("</g>");
        }

        foreach (var (line, index) in caption.Select((line, index) => (line, index)))
        {
            svg.Add($"""<text x="{Margin}" y="{TitleHeight + body + (index + 1) * CaptionLine}">{line}</text>""");
        }

        return svg.AddRaw("</svg>").ToString();
    }

    /// <summary>
    /// The picture inside a page, whose style sheet gives width and colours: row labels, cells and legend as three SVGs side by
    /// side, since only the cells follow the page's width. Title and caption are the page's.
    /// </summary>
    /// <param name="figure">The description, with at least one row.</param>
    /// <param name="id">Identity on the page: letters and digits.</param>
    public static string RenderInline(HeatmapFigure figure, string id)
    {
        ArgumentNullException.ThrowIfNull(figure);
        var height = HeatmapGeometry.Head + HeatmapGeometry.PlotHeight(figure);
        var svg = new SvgWriter();
        svg.Add($"""<div class="fig-pair" role="img" aria-label="{figure.Title}: {figure.Subtitle}">""");
        svg.Add($"""<svg class="fig fig-labels" aria-hidden="true" width="{HeatmapGeometry.LabelWidth - HeatmapGeometry.LabelGap}" height="{height}" font-size="12">""");
        Labels(svg, figure);
        svg.Add($"""</svg><svg class="fig fig-plot" aria-hidden="true" width="{HeatmapGeometry.PlotWidth}" height="{height}" font-size="12">""");
        svg.AddRaw(HatchPattern($"hatch-{id}"));
        Plot(svg, figure, $"hatch-{id}");
        svg.Add($"""</svg></div><svg class="fig fig-foot" aria-hidden="true" width="{HeatmapGeometry.Width}" height="{HeatmapGeometry.Foot}" font-size="12">""");
        HeatmapLegendSvg.Write(svg, figure.Scale, figure.ScaleTitle, 0, $"hatch-{id}");
        return svg.AddRaw("</svg>").ToString();
    }

    private static void Body(SvgWriter svg, HeatmapFigure figure, string hatch)
    {
        var (plot, height) = (HeatmapGeometry.PlotHeight(figure), HeatmapGeometry.Height(figure));
        svg.AddRaw(HatchPattern(hatch));
        svg.Add($"""<svg width="{HeatmapGeometry.LabelWidth - HeatmapGeometry.LabelGap}" height="{height}" overflow="visible">""");
        Labels(svg, figure);
        svg.Add($"""</svg><svg x="{HeatmapGeometry.LabelWidth}" width="{HeatmapGeometry.PlotWidth}" height="{height}" overflow="visible">""");
        Plot(svg, figure, hatch);
        svg.AddRaw("</svg>");
        HeatmapLegendSvg.Write(svg, figure.Scale, figure.ScaleTitle, HeatmapGeometry.Head + plot, hatch);
    }

    // Hours, daylight, cells and sun lines, as wide as the space they are in.
    private static void Plot(SvgWriter svg, HeatmapFigure figure, string hatch)
    {
        var plot = HeatmapGeometry.PlotHeight(figure);
        HeatmapHeadSvg.Write(svg, figure);
        svg.Add($"""<svg y="{HeatmapGeometry.Head}" width="100%" height="{plot}" overflow="visible">""");
        HeatmapCellsSvg.Write(svg, figure.Rows, figure.Scale, CellSize.Large, hatch);
        HeatmapHeadSvg.WriteSunLines(svg, figure, plot);
        svg.AddRaw("</svg>");
    }

    /// <summary>The hatching of what nobody observed.</summary>
    internal static string HatchPattern(string id) => new SvgWriter().Add(
        $"""<defs><pattern id="{id}" width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><path class="fig-hatch" d="M.5 0v5" stroke="{Ink.Hatch}" stroke-width="1"/></pattern></defs>""").ToString();

    private static void Labels(SvgWriter svg, HeatmapFigure figure)
    {
        if (figure.Daylight is not null)
        {
            svg.Add($"""<text class="fig-soft" x="100%" y="32" text-anchor="end" fill="{Ink.Grey}">Daylight</text>""");
        }

        svg.Add($"""<text class="fig-soft" x="100%" y="50" text-anchor="end" fill="{Ink.Grey}">{figure.HourTitle}</text>""");
        foreach (var (row, index) in figure.Rows.Select((row, index) => (row, index)))
        {
            var y = HeatmapGeometry.Head + index * HeatmapGeometry.RowHeight + 14;
            svg.Add($"""<text class="fig-name" y="{y}">{row.Band.Name}</text><text class="fig-khz" x="100%" y="{y}" text-anchor="end">{row.Band.ShortLabel}</text>""");
        }
    }

    /// <summary>Hours as per cent of the cells' width.</summary>
    internal static double Percent(double hours) => hours / 24 * 100;

    private static IEnumerable<string> Wrap(string sentence)
    {
        var line = new StringBuilder();
        foreach (var word in sentence.Split(' '))
        {
            if (line.Length > 0 && line.Length + 1 + word.Length > CaptionCharacters)
            {
                yield return line.ToString();
                line.Clear();
            }

            line.Append(line.Length > 0 ? " " : "").Append(word);
        }

        yield return line.ToString();
    }
}
