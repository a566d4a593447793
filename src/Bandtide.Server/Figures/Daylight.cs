using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;

namespace Bandtide.Server.Figures;

/// <summary>When the Sun is up over the stations of a heatmap, on its clock: the strip above the picture.</summary>
/// <param name="Shares">Share of the stations (and months) in daylight, 0 to 1, for each quarter of an hour from 00:00.</param>
/// <param name="RiseHour">Sunrise of the one station and month shown, hours, or <c>null</c>.</param>
/// <param name="SetHour">Sunset likewise.</param>
/// <param name="Sentence">What the strip shows.</param>
public sealed record Daylight(IReadOnlyList<double> Shares, double? RiseHour, double? SetHour, string Sentence)
{
    private const int QuartersPerDay = 96;

    // Rise and set are worked out for at most so many places and months; more of them are thinned evenly from west to east.
    private const int MostCases = 96;

    /// <summary>The strip for an answer, or <c>null</c> where it has no station.</summary>
    public static Daylight? Of(HeatmapQuery query, IReadOnlyList<Station> stations)
    {
        ArgumentNullException.ThrowIfNull(query);
        ArgumentNullException.ThrowIfNull(stations);
        var cases = stations
            .OrderBy(station => station.Square.West)
            .SelectMany(station => Months(query, station).Select(month => (Place: station.Square, Month: month)))
            .ToList();
        if (cases.Count == 0)
        {
            return null;
        }

        var suns = Thin(cases).Select(one => MonthSun.RiseSet(one.Place.Centre, one.Month, query.Clock)).ToList();
        var shares = Enumerable.Range(0, QuartersPerDay)
            .Select(quarter => suns.Count(sun => IsUp(sun, (quarter + 0.5) / 4)) / (double)suns.Count)
            .ToList();
        var single = cases.Count == 1 ? suns[0] : default(MonthSun?);
        return new(shares, single?.RiseHour, single?.SetHour, Describe(query, suns, cases[0].Place));
    }

    /// <summary>Whether the Sun is up at an hour of the clock.</summary>
    internal static bool IsUp(MonthSun sun, double hour) => (sun.RiseHour, sun.SetHour) switch
    {
        ({ } rise, { } set) => rise <= set ? hour >= rise && hour < set : hour >= rise || hour < set,
        ({ } rise, null) => hour >= rise,
        (null, { } set) => hour < set,
        _ => sun.Status == SunDayStatus.PolarDay,
    };

    private static IEnumerable<YearMonth> Months(HeatmapQuery query, Station station) => query.Period switch
    {
        // The Sun's year repeats: of a long range its last twelve months tell all.
        Period.Months months => YearMonth.Range(months.From, months.To).TakeLast(12),
        Period.SeasonOf season => Seasons.Months(
            season.Season,
            season.ToYear ?? 2025,
            query.Alignment == SeasonAlignment.Calendar ? Hemisphere.North : Seasons.HemisphereOf(station.Square.Centre.LatitudeDegrees)),
        _ => throw new ArgumentOutOfRangeException(nameof(query)),
    };

    private static IEnumerable<T> Thin<T>(List<T> cases) => cases.Count <= MostCases
        ? cases
        : Enumerable.Range(0, MostCases).Select(i => cases[(int)((i + 0.5) * cases.Count / MostCases)]);

    private static string Describe(HeatmapQuery query, List<MonthSun> suns, MaidenheadLocator square)
    {
        var clock = query.Clock == HourClock.Utc ? "UTC" : "solar time";
        if (query.Station is null)
        {
            return "The strip above the columns shows how many of the stations are in daylight: open for all, solid for none.";
        }

        if (suns.Count > 1)
        {
            var rises = suns.Where(sun => sun.RiseHour is not null).Select(sun => sun.RiseHour!.Value).ToList();
            return rises.Count == 0
                ? $"No sunrise in square {square} in these months."
                : $"The strip above the columns shows daylight in square {square} over these months: open by day in all, solid by night in all.";
        }

        return suns[0] switch
        {
            { RiseHour: { } rise, SetHour: { } set } =>
                $"Sunrise {FigureWords.ClockTime(rise)}, sunset {FigureWords.ClockTime(set)} {clock}: on the 15th, in the middle of square {square}.",
            { Status: SunDayStatus.PolarDay } => $"The Sun does not set on the 15th in square {square}.",
            { Status: SunDayStatus.PolarNight } => $"The Sun does not rise on the 15th in square {square}.",
            _ => $"The Sun only grazes the horizon on the 15th in square {square}.",
        };
    }
}
