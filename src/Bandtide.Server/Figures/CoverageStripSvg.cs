using System.Text;
using Bandtide.Storage.Coverage;

namespace Bandtide.Server.Figures;

/// <summary>Draws a year of one station as a strip of days: as high as hours were reported, and hanging from above where withdrawn.</summary>
internal static class CoverageStripSvg
{
    private const int Height = 24;

    /// <summary>The strip, as wide as the space it is in.</summary>
    /// <param name="days">One entry per date.</param>
    /// <param name="from">The first date.</param>
    /// <param name="label">What a reader who cannot see it is told.</param>
    public static string Render(IReadOnlyList<CoverageDay?> days, DateOnly from, string label)
    {
        ArgumentNullException.ThrowIfNull(days);
        var (complete, partial, withdrawn) = (new StringBuilder(), new StringBuilder(), new StringBuilder());
        for (var day = 0; day < days.Count; day++)
        {
            switch (days[day].Kind())
            {
                case CoverageKind.Complete:
                    complete.Append(System.Globalization.CultureInfo.InvariantCulture, $"M{day} 0h1v{Height}h-1z");
                    break;
                case CoverageKind.Partial:
                    var hours = days[day]!.Value.Hours();
                    partial.Append(System.Globalization.CultureInfo.InvariantCulture, $"M{day} {Height - hours}h1v{hours}h-1z");
                    break;
                case CoverageKind.Withdrawn:
                    withdrawn.Append(System.Globalization.CultureInfo.InvariantCulture, $"M{day} 0h1v7h-1z");
                    break;
            }
        }

        var svg = new SvgWriter();
        svg.Add($"""<svg class="fig-strip" role="img" aria-label="{label}" height="{Height + 2}">""");
        for (var month = 1; month < 12 && days.Count > 31; month++)
        {
            var x = (new DateOnly(from.Year, month + 1, 1).DayNumber - from.DayNumber) / (double)days.Count * 100;
            svg.Add($"""<line class="fig-grid" x1="{x}%" x2="{x}%" y1="0" y2="{Height + 2}"/>""");
        }

        svg.Add($"""<svg viewBox="0 0 {days.Count} {Height}" width="100%" height="{Height}" preserveAspectRatio="none" shape-rendering="crispEdges"><path class="fig-complete" d="{complete}"/><path class="fig-partial" d="{partial}"/><path class="fig-withdrawn" d="{withdrawn}"/></svg>""");
        svg.Add($"""<line class="fig-frame" x1="0" x2="100%" y1="{Height + 0.5}" y2="{Height + 0.5}"/>""");
        return svg.AddRaw("</svg>").ToString();
    }
}
