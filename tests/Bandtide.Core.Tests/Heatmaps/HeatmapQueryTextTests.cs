using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Heatmaps;

public sealed class HeatmapQueryTextTests
{
    private static readonly Gen<YearMonth> Month = Gen.Select(Gen.Int[1950, 9997], Gen.Int[1, 12]).Select((year, month) => new YearMonth(year, month));

    private static readonly Gen<Period> Periods = Gen.OneOf<Period>(
        Gen.Select(Month, Gen.Int[0, 1199]).Select<(YearMonth From, int More), Period>(
            range => new Period.Months(range.From, YearMonth.FromNumber(Math.Min(range.From.Number + range.More, new YearMonth(9998, 12).Number)))),
        Gen.Enum<Season>().Select<Season, Period>(season => new Period.SeasonOf(season, null, null)),
        Gen.Select(Gen.Enum<Season>(), Gen.Int[1950, 9800], Gen.Int[0, 99]).Select<(Season Season, int First, int More), Period>(
            season => new Period.SeasonOf(season.Season, season.First, season.First + season.More)));

    private static readonly Gen<HeatmapQuery> Queries =
        from isRegion in Gen.Bool
        from code in Gen.Char["abc019-"].Array[2, 24].Select(characters => new string(characters))
        from period in Periods
        from measure in Gen.Enum<Measure>()
        from statistic in Gen.Enum<Statistic>()
        from clock in Gen.Enum<HourClock>()
        from layer in Gen.Enum<BandLayer>()
        from interval in Gen.Enum<IntervalChoice>()
        from alignment in Gen.Enum<SeasonAlignment>()
        from vote in Gen.Enum<VoteUnit>()
        from days in Gen.Int[1, 100]
        from sweeps in Gen.Int[1, 1_000_000]
        select new HeatmapQuery(isRegion ? null : code, isRegion ? code : null, period)
        {
            Measure = measure,
            Statistic = statistic,
            Clock = clock,
            Layer = layer,
            Interval = interval,
            Alignment = alignment,
            Vote = vote,
            MinDays = days,
            MinSweeps = sweeps,
        };

    [Fact]
    public void What_is_written_reads_back_the_same() => Queries.Sample(query =>
    {
        var text = HeatmapQueryText.ToQueryString(query);
        Assert.Equal(query, Parse(text));
        Assert.Equal(text, Uri.EscapeDataString(text).Replace("%3D", "=", StringComparison.Ordinal).Replace("%26", "&", StringComparison.Ordinal));
    });

    [Fact]
    public void Defaults_are_not_written() => Assert.Equal(
        "region=all&month=2026-06",
        HeatmapQueryText.ToQueryString(Parse(
            "minsweeps=1&mindays=1&vote=station&align=local&adjust=none&interval=auto&layer=service&clock=utc&stat=mean&measure=occupancy&month=2026-06&region=all")!));

    // The words and defaults of the data contract.
    [Theory]
    [InlineData("station=ab&season=winter&years=2024..2026&measure=level-p90&stat=p90&clock=solar&layer=slice&interval=none&align=calendar&vote=square&mindays=3&minsweeps=60")]
    [InlineData("region=field-ko&from=2024-11&to=2025-02&measure=excess&stat=median")]
    [InlineData("region=itu-1&season=autumn&measure=steady&stat=sd")]
    [InlineData("region=square-ko33&season=spring&years=2024&measure=floor&stat=p10")]
    [InlineData("station=a-1&month=2026-06&measure=signal")]
    [InlineData("station=a-1&season=summer&measure=level")]
    public void Every_word_of_the_contract_is_read_and_written_in_one_order(string text) =>
        Assert.Equal(text, HeatmapQueryText.ToQueryString(Parse(text)!));

    [Fact]
    public void An_empty_value_is_an_absent_one() =>
        Assert.Equal(new HeatmapQuery(null, "all", new Period.Months(new(2026, 6), new(2026, 6))), Parse("region=all&station=&month=2026-06&from=&to=&mindays=&measure="));

    [Theory]
    [InlineData("month=2026-06", "region")]
    [InlineData("region=all&station=ab&month=2026-06", "station")]
    [InlineData("region=all&region=ab&month=2026-06", "region")]
    [InlineData("region=A&month=2026-06", "region")]
    [InlineData("station=abcdefghijklmnopqrstuvwxy&month=2026-06", "station")]
    [InlineData("region=all", "month")]
    [InlineData("region=all&month=2026-06&season=winter", "month")]
    [InlineData("region=all&month=2026-06&from=2026-06&to=2026-07", "month")]
    [InlineData("region=all&month=2026-06&years=2026", "month")]
    [InlineData("region=all&from=2026-06", "to")]
    [InlineData("region=all&to=2026-06", "from")]
    [InlineData("region=all&from=2026-07&to=2026-06", "to")]
    [InlineData("region=all&from=1950-01&to=2050-01", "to")]
    [InlineData("region=all&month=2026-13", "month")]
    [InlineData("region=all&month=2026-6", "month")]
    [InlineData("region=all&month=1949-12", "month")]
    [InlineData("region=all&month=%202026-06", "month")]
    [InlineData("region=all&years=2026", "season")]
    [InlineData("region=all&season=Winter", "season")]
    [InlineData("region=all&season=winter&years=2026..2025", "years")]
    [InlineData("region=all&season=winter&years=2024..", "years")]
    [InlineData("region=all&season=winter&years=2024-2026", "years")]
    [InlineData("region=all&season=winter&years=1950..2050", "years")]
    [InlineData("region=all&month=2026-06&measure=Level", "measure")]
    [InlineData("region=all&month=2026-06&measure=level_p90", "measure")]
    [InlineData("region=all&month=2026-06&stat=p50", "stat")]
    [InlineData("region=all&month=2026-06&clock=local", "clock")]
    [InlineData("region=all&month=2026-06&layer=0", "layer")]
    [InlineData("region=all&month=2026-06&interval=yes", "interval")]
    [InlineData("region=all&month=2026-06&align=north", "align")]
    [InlineData("region=all&month=2026-06&vote=1", "vote")]
    [InlineData("region=all&month=2026-06&adjust=station", "adjust")]
    [InlineData("region=all&month=2026-06&adjust=all", "adjust")]
    [InlineData("region=all&month=2026-06&mindays=0", "mindays")]
    [InlineData("region=all&month=2026-06&mindays=-1", "mindays")]
    [InlineData("region=all&month=2026-06&mindays=1.5", "mindays")]
    [InlineData("region=all&month=2026-06&minsweeps=1000001", "minsweeps")]
    [InlineData("region=all&month=2026-06&minsweeps=99999999999", "minsweeps")]
    public void What_is_missing_contradictory_or_malformed_is_named(string text, string field)
    {
        Assert.Null(Parse(text, out var problems));
        var problem = Assert.Single(problems);
        Assert.Equal(field, problem.Field);
        Assert.NotEmpty(problem.Rule);
        Assert.NotEmpty(problem.Message);
    }

    [Fact]
    public void Every_problem_is_named_at_once()
    {
        Assert.Null(Parse("station=X&month=no&measure=no&stat=no&clock=no&layer=no&adjust=no&interval=no&align=no&vote=no&mindays=no&minsweeps=no", out var problems));
        Assert.Equal(
            ["station", "month", "adjust", "measure", "stat", "clock", "layer", "interval", "align", "vote", "mindays", "minsweeps"],
            problems.Select(problem => problem.Field));
    }

    [Fact]
    public void Any_text_gives_a_query_or_a_problem() => Gen.Select(Gen.Int[0, HeatmapQueryText.Names.Count - 1], Gen.String).Array[0, 8].Sample(values =>
    {
        var given = values.ToLookup(value => HeatmapQueryText.Names[value.Item1], value => value.Item2, StringComparer.Ordinal);
        var query = HeatmapQueryText.Parse(name => [.. given[name]], out var problems);
        Assert.Equal(query is null, problems.Count > 0);
        Assert.All(problems, problem => Assert.Contains(problem.Field, HeatmapQueryText.Names));
    });

    private static HeatmapQuery? Parse(string text)
    {
        var query = Parse(text, out var problems);
        Assert.Empty(problems);
        return query;
    }

    private static HeatmapQuery? Parse(string text, out IReadOnlyList<QueryProblem> problems)
    {
        var pairs = text.Split('&').Select(pair => pair.Split('=')).ToLookup(pair => pair[0], pair => Uri.UnescapeDataString(pair[1]), StringComparer.Ordinal);
        return HeatmapQueryText.Parse(name => [.. pairs[name]], out problems);
    }
}
