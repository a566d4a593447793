using System.Globalization;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Figures;

/// <summary>The words that pictures, forms and tables share.</summary>
internal static class FigureWords
{
    /// <summary>A statistic's name in the middle of a sentence.</summary>
    public static string Name(Statistic statistic) => statistic switch
    {
        Statistic.Mean => "mean",
        Statistic.Median => "median",
        Statistic.P10 => "10th percentile",
        Statistic.P90 => "90th percentile",
        _ => "standard deviation",
    };

    /// <summary>A month in words, such as <c>June 2026</c>.</summary>
    public static string Name(YearMonth month) => month.FirstDay.ToString("MMMM yyyy", CultureInfo.InvariantCulture);

    /// <summary>A date in words, such as <c>4 June 2026</c>.</summary>
    public static string Name(DateOnly date) => date.ToString("d MMMM yyyy", CultureInfo.InvariantCulture);

    /// <summary>A season in the middle of a sentence.</summary>
    public static string Name(Season season) => season switch
    {
        Season.Winter => "winter",
        Season.Spring => "spring",
        Season.Summer => "summer",
        _ => "autumn",
    };

    /// <summary>A period in words, to begin a line with.</summary>
    public static string Name(Period period) => period switch
    {
        Period.Months months when months.From == months.To => Name(months.From),
        Period.Months months when months.From.Year == months.To.Year =>
            $"{months.From.FirstDay.ToString("MMMM", CultureInfo.InvariantCulture)} to {Name(months.To)}",
        Period.Months months => $"{Name(months.From)} to {Name(months.To)}",
        Period.SeasonOf { FromYear: null } all => $"Every {Name(all.Season)}",
        Period.SeasonOf one when one.FromYear == one.ToYear => string.Create(CultureInfo.InvariantCulture, $"{Capital(Name(one.Season))} {one.FromYear}"),
        Period.SeasonOf some => string.Create(CultureInfo.InvariantCulture, $"{Capital(Name(some.Season))}, {some.FromYear} to {some.ToYear}"),
        _ => throw new ArgumentOutOfRangeException(nameof(period)),
    };

    /// <summary>The name of the station or region a query asks for, or its code where there is none.</summary>
    public static string PlaceName(NetworkView network, HeatmapQuery query)
    {
        ArgumentNullException.ThrowIfNull(network);
        ArgumentNullException.ThrowIfNull(query);
        return query.Station is { } station
            ? network.FindStation(station)?.Name ?? station
            : network.FindRegion(query.Region!)?.Name ?? query.Region!;
    }

    /// <summary>The column of an hour, such as <c>05–06 UTC</c>.</summary>
    public static string HourSpan(int hour, HourClock clock) =>
        string.Create(CultureInfo.InvariantCulture, $"{hour:00}–{(hour + 1) % 24:00} {(clock == HourClock.Utc ? "UTC" : "solar time")}");

    /// <summary>A time of day, such as <c>05:31</c>.</summary>
    /// <param name="hours">Hours, 0 up to 24.</param>
    public static string ClockTime(double hours)
    {
        var minutes = (int)Math.Round(hours * 60, MidpointRounding.AwayFromZero) % 1440;
        return string.Create(CultureInfo.InvariantCulture, $"{minutes / 60:00}:{minutes % 60:00}");
    }

    /// <summary>A count with its noun, such as <c>1 station</c> or <c>1,204 stations</c>.</summary>
    public static string Count(int number, string noun) =>
        string.Create(CultureInfo.InvariantCulture, $"{number:#,0} {noun}{(number == 1 ? "" : "s")}");

    /// <summary>The text with its first letter as a capital.</summary>
    public static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];
}
