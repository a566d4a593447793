using System.Globalization;

namespace Bandtide.Server.Figures;

/// <summary>Draws what stands above the cells of a heatmap: sunrise and sunset, the daylight strip and the hours.</summary>
internal static class HeatmapHeadSvg
{
    private const int StripTop = 23;
    private const int StripHeight = 9;
    private const int HourBaseline = 50;

    // In hours, on a narrow page: the width of a text, and from where on it has room on either side.
    private const double TextHours = 7.5;
    private const double LeftRoom = 3;
    private const double RightRoom = 20.5;

    /// <summary>Writes the head, in the coordinates of the plot.</summary>
    public static void Write(SvgWriter svg, HeatmapFigure figure)
    {
        if (figure.Daylight is { } daylight)
        {
            Strip(svg, daylight);
            SunTimes(svg, daylight);
        }

        for (var hour = 0; hour < 24; hour++)
        {
            var kind = hour % 3 == 0 ? "fig-hour" : "fig-hour fig-minor";
            svg.Add($"""<text class="{kind}" x="{HeatmapSvg.Percent(hour + 0.5)}%" y="{HourBaseline}" text-anchor="middle" font-size="11">{hour.ToString("00", CultureInfo.InvariantCulture)}</text>""");
        }
    }

    /// <summary>Writes the lines of sunrise and sunset across the cells, in the coordinates of the cells.</summary>
    public static void WriteSunLines(SvgWriter svg, HeatmapFigure figure, int height)
    {
        foreach (var hour in SunHours(figure.Daylight))
        {
            var x = HeatmapSvg.Percent(hour);
            svg.Add($"""<line class="fig-halo" x1="{x}%" x2="{x}%" y1="0" y2="{height}" stroke="{Ink.Paper}" stroke-width="3.5"/>""");
            svg.Add($"""<line class="fig-sun" x1="{x}%" x2="{x}%" y1="0" y2="{height}" stroke="{Ink.Second}" stroke-width="1.5"/>""");
        }
    }

    private static IEnumerable<double> SunHours(Daylight? daylight)
    {
        if (daylight?.RiseHour is { } rise)
        {
            yield return rise;
        }

        if (daylight?.SetHour is { } set)
        {
            yield return set;
        }
    }

    private static void Strip(SvgWriter svg, Daylight daylight)
    {
        svg.Add($"""<rect class="fig-night" y="{StripTop}" width="100%" height="{StripHeight}" fill="{Ink.Night}"/>""");
        for (var quarter = 0; quarter < daylight.Shares.Count; quarter++)
        {
            var from = quarter;
            var share = Math.Round(daylight.Shares[from], 2);
            while (quarter + 1 < daylight.Shares.Count && Math.Round(daylight.Shares[quarter + 1], 2) == share)
            {
                quarter++;
            }

            if (share > 0)
            {
                svg.Add($"""<rect class="fig-day" x="{HeatmapSvg.Percent(from / 4.0)}%" y="{StripTop}" width="{HeatmapSvg.Percent((quarter + 1 - from) / 4.0)}%" height="{StripHeight}" fill="{Ink.Day}" fill-opacity="{share}"/>""");
            }
        }

        svg.Add($"""<rect class="fig-frame" y="{StripTop}" width="100%" height="{StripHeight}" fill="none" stroke="{Ink.Black}" stroke-width="0.75"/>""");
    }

    // Texts stand on the outer side of their lines where there is room; on a narrow page one is as wide as seven columns.
    private static void SunTimes(SvgWriter svg, Daylight daylight)
    {
        if (daylight is not { RiseHour: { } rise, SetHour: { } set })
        {
            return;
        }

        var (earlier, later) = (Math.Min(rise, set), Math.Max(rise, set));
        if ((earlier < LeftRoom && later < LeftRoom + TextHours) || (later > RightRoom && earlier > RightRoom - TextHours))
        {
            return;
        }

        var (left, right) = rise <= set ? ("sunrise", "sunset") : ("sunset", "sunrise");
        SunTime(svg, earlier, left, earlier < LeftRoom ? "start" : "end");
        SunTime(svg, later, right, later > RightRoom ? "end" : later > 24 - TextHours ? "middle" : "start");
    }

    private static void SunTime(SvgWriter svg, double hour, string name, string anchor) =>
        svg.Add($"""<text class="fig-sun-time" x="{HeatmapSvg.Percent(hour)}%" y="16" text-anchor="{anchor}" fill="{Ink.Second}">{name} {FigureWords.ClockTime(hour)}</text>""");
}
