using System.Globalization;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>Heatmap queries as text: the API's query string and a page's address are the same words.</summary>
public static class HeatmapQueryText
{
    /// <summary>Largest value of <c>mindays</c> and <c>minsweeps</c>.</summary>
    public const int LargestMinimum = 1_000_000;

    private const int MostMonths = 1200;

    private static readonly IReadOnlyList<(Statistic Value, string Code)> StatisticCodes =
        [(Statistic.Mean, "mean"), (Statistic.Median, "median"), (Statistic.P10, "p10"), (Statistic.P90, "p90"), (Statistic.Sd, "sd")];

    private static readonly IReadOnlyList<(HourClock Value, string Code)> ClockCodes = [(HourClock.Utc, "utc"), (HourClock.Solar, "solar")];
    private static readonly IReadOnlyList<(BandLayer Value, string Code)> LayerCodes = [(BandLayer.Service, "service"), (BandLayer.Slice, "slice")];
    private static readonly IReadOnlyList<(IntervalChoice Value, string Code)> IntervalCodes = [(IntervalChoice.Auto, "auto"), (IntervalChoice.None, "none")];

    private static readonly IReadOnlyList<(SeasonAlignment Value, string Code)> AlignmentCodes =
        [(SeasonAlignment.Local, "local"), (SeasonAlignment.Calendar, "calendar")];

    private static readonly IReadOnlyList<(VoteUnit Value, string Code)> VoteCodes = [(VoteUnit.Station, "station"), (VoteUnit.Square, "square")];

    private static readonly IReadOnlyList<(Season Value, string Code)> SeasonCodes =
        [(Season.Winter, "winter"), (Season.Spring, "spring"), (Season.Summer, "summer"), (Season.Autumn, "autumn")];

    private static readonly IReadOnlyList<(Measure Value, string Code)> MeasureCodes = [.. Measures.All.Select(info => (info.Measure, info.Code))];

    /// <summary>Every name that a heatmap query may hold, beside <c>format</c>.</summary>
    public static IReadOnlyList<string> Names { get; } =
    [
        "region", "station", "month", "from", "to", "season", "years", "measure", "stat", "clock", "layer", "adjust", "interval",
        "align", "vote", "mindays", "minsweeps",
    ];

    /// <summary>The word for a statistic.</summary>
    public static string Code(Statistic value) => CodeOf(StatisticCodes, value);

    /// <summary>The word for a clock.</summary>
    public static string Code(HourClock value) => CodeOf(ClockCodes, value);

    /// <summary>The word for a layer.</summary>
    public static string Code(BandLayer value) => CodeOf(LayerCodes, value);

    /// <summary>The word for a season.</summary>
    public static string Code(Season value) => CodeOf(SeasonCodes, value);

    /// <summary>The word for a vote.</summary>
    public static string Code(VoteUnit value) => CodeOf(VoteCodes, value);

    /// <summary>The word for an alignment.</summary>
    public static string Code(SeasonAlignment value) => CodeOf(AlignmentCodes, value);

    /// <summary>Reads a query.</summary>
    /// <param name="values">All values of a name in the order they were given; empty where the name is absent. Empty values count as absent.</param>
    /// <param name="problems">Every problem found.</param>
    /// <returns>The query, or <c>null</c> when there is a problem.</returns>
    public static HeatmapQuery? Parse(Func<string, IReadOnlyList<string>> values, out IReadOnlyList<QueryProblem> problems)
    {
        ArgumentNullException.ThrowIfNull(values);
        var found = new List<QueryProblem>();
        problems = found;
        string? Value(string name)
        {
            var given = values(name).Where(text => !string.IsNullOrEmpty(text)).ToList();
            if (given.Count > 1)
            {
                found.Add(new(name, "value-twice", $"{name} is given {given.Count} times; give it once."));
            }

            return given.Count > 0 ? given[0] : null;
        }

        var (station, region) = Selection(Value("station"), Value("region"), found);
        var period = PeriodOf(Value("month"), Value("from"), Value("to"), Value("season"), Value("years"), found);
        if (Value("adjust") is { } adjust && !string.Equals(adjust, "none", StringComparison.Ordinal))
        {
            found.Add(new("adjust", "adjust-unavailable", $"'{Shown(adjust)}' is not available; only none is, so far."));
        }

        var query = new HeatmapQuery(station, region, period ?? new Period.Months(default, default))
        {
            Measure = Choice("measure", MeasureCodes, Measure.Occupancy, Value, found),
            Statistic = Choice("stat", StatisticCodes, Statistic.Mean, Value, found),
            Clock = Choice("clock", ClockCodes, HourClock.Utc, Value, found),
            Layer = Choice("layer", LayerCodes, BandLayer.Service, Value, found),
            Interval = Choice("interval", IntervalCodes, IntervalChoice.Auto, Value, found),
            Alignment = Choice("align", AlignmentCodes, SeasonAlignment.Local, Value, found),
            Vote = Choice("vote", VoteCodes, VoteUnit.Station, Value, found),
            MinDays = Minimum("mindays", Value, found),
            MinSweeps = Minimum("minsweeps", Value, found),
        };
        return found.Count == 0 ? query : null;
    }

    /// <summary>The query string without a question mark: selection, period, then what differs from the defaults.</summary>
    public static string ToQueryString(HeatmapQuery query)
    {
        ArgumentNullException.ThrowIfNull(query);
        var text = new StringBuilder();
        void Add(string name, string? value)
        {
            if (value is not null)
            {
                text.Append(text.Length == 0 ? "" : "&").Append(name).Append('=').Append(value);
            }
        }

        Add("region", query.Region);
        Add("station", query.Station);
        switch (query.Period)
        {
            case Period.Months months when months.From == months.To:
                Add("month", months.From.ToString());
                break;
            case Period.Months months:
                Add("from", months.From.ToString());
                Add("to", months.To.ToString());
                break;
            case Period.SeasonOf season:
                Add("season", Code(season.Season));
                Add("years", Years(season));
                break;
        }

        Add("measure", query.Measure == Measure.Occupancy ? null : query.Measure.Info().Code);
        Add("stat", query.Statistic == Statistic.Mean ? null : Code(query.Statistic));
        Add("clock", query.Clock == HourClock.Utc ? null : Code(query.Clock));
        Add("layer", query.Layer == BandLayer.Service ? null : Code(query.Layer));
        Add("interval", query.Interval == IntervalChoice.Auto ? null : "none");
        Add("align", query.Alignment == SeasonAlignment.Local ? null : Code(query.Alignment));
        Add("vote", query.Vote == VoteUnit.Station ? null : Code(query.Vote));
        Add("mindays", query.MinDays == 1 ? null : query.MinDays.ToString(CultureInfo.InvariantCulture));
        Add("minsweeps", query.MinSweeps == 1 ? null : query.MinSweeps.ToString(CultureInfo.InvariantCulture));
        return text.ToString();
    }

    private static (string? Station, string? Region) Selection(string? station, string? region, List<QueryProblem> problems)
    {
        if (station is null == region is null)
        {
            problems.Add(station is null
                ? new("region", "selection-missing", "Name a region or a station.")
                : new("station", "selection-contradictory", "Name a region or a station, not both."));
        }

        foreach (var (name, code) in new[] { ("station", station), ("region", region) })
        {
            if (code is not null && !Codes.IsValid(code))
            {
                problems.Add(new(name, "code-syntax", $"'{Shown(code)}' is not a code: 2 to 24 of a-z, 0-9 and -."));
            }
        }

        return (station, region);
    }

    private static Period? PeriodOf(string? month, string? from, string? to, string? season, string? years, List<QueryProblem> problems)
    {
        var kinds = (month is null ? 0 : 1) + (from is null && to is null ? 0 : 1) + (season is null && years is null ? 0 : 1);
        if (kinds != 1)
        {
            problems.Add(kinds == 0
                ? new("month", "period-missing", "Name a period: month, or from and to, or season.")
                : new("month", "period-contradictory", "Name one period only: month, or from and to, or season with years."));
            return null;
        }

        if (season is not null || years is not null)
        {
            return SeasonOf(season, years, problems);
        }

        var first = Month(month is null ? "from" : "month", month ?? from, problems);
        var last = month is null ? Month("to", to, problems) : first;
        if (first is not { } a || last is not { } b)
        {
            return null;
        }

        if (b.Number < a.Number || b.Number - a.Number >= MostMonths)
        {
            problems.Add(new("to", "range-order", $"to must not come before from, nor lie {MostMonths} months or more after it."));
            return null;
        }

        return new Period.Months(a, b);
    }

    private static Period.SeasonOf? SeasonOf(string? season, string? years, List<QueryProblem> problems)
    {
        if (season is null)
        {
            problems.Add(new("season", "season-missing", "years needs a season: winter, spring, summer or autumn."));
            return null;
        }

        var which = Choice("season", SeasonCodes, Season.Winter, _ => season, problems);
        if (years is null)
        {
            return new(which, null, null);
        }

        var ends = years.Split("..");
        if (ends.Length <= 2 && Year(ends[0]) is { } first && Year(ends[^1]) is { } last && first <= last && last - first < MostMonths / 12)
        {
            return new(which, first, last);
        }

        problems.Add(new("years", "years-syntax", $"'{Shown(years)}' is not a year or a range such as 2024..2026."));
        return null;
    }

    private static int? Year(string text) =>
        text.Length == 4 && int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var year) && year is >= 1950 and <= 9997 ? year : null;

    private static YearMonth? Month(string name, string? text, List<QueryProblem> problems)
    {
        if (text is null)
        {
            problems.Add(new(name, "month-missing", $"A range needs both from and to; {name} is missing."));
            return null;
        }

        if (YearMonth.TryParse(text, CultureInfo.InvariantCulture, out var month))
        {
            return month;
        }

        problems.Add(new(name, "month-syntax", $"'{Shown(text)}' is not a month, yyyy-MM, from 1950 on."));
        return null;
    }

    private static T Choice<T>(
        string name, IReadOnlyList<(T Value, string Code)> choices, T fallback, Func<string, string?> value, List<QueryProblem> problems)
    {
        if (value(name) is not { } text)
        {
            return fallback;
        }

        foreach (var (choice, code) in choices)
        {
            if (string.Equals(code, text, StringComparison.Ordinal))
            {
                return choice;
            }
        }

        problems.Add(new(name, "choice", $"'{Shown(text)}' is not one of {string.Join(", ", choices.Select(choice => choice.Code))}."));
        return fallback;
    }

    private static int Minimum(string name, Func<string, string?> value, List<QueryProblem> problems)
    {
        if (value(name) is not { } text)
        {
            return 1;
        }

        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var number) && number is >= 1 and <= LargestMinimum)
        {
            return number;
        }

        problems.Add(new(name, "minimum-range", $"'{Shown(text)}' is not a whole number from 1 to {LargestMinimum}."));
        return 1;
    }

    private static string? Years(Period.SeasonOf season) => season switch
    {
        { FromYear: { } first, ToYear: { } last } when first == last => first.ToString(CultureInfo.InvariantCulture),
        { FromYear: { } first, ToYear: { } last } => string.Create(CultureInfo.InvariantCulture, $"{first}..{last}"),
        _ => null,
    };

    private static string CodeOf<T>(IReadOnlyList<(T Value, string Code)> choices, T value) =>
        choices.First(choice => EqualityComparer<T>.Default.Equals(choice.Value, value)).Code;

    private static string Shown(string text) => text.Length <= 40 ? text : text[..40] + "…";
}
