using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Heatmaps;
using Bandtide.Testing.Databases;
using CsCheck;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Heatmaps;

/// <summary>Whatever the way through tiles, sheets and caches, a heatmap is the plain computation from the day sheets.</summary>
public sealed class HeatmapValueTests
{
    private static readonly GeoPoint[] Places =
    [
        new(52.5, 13.4), new(52.6, 13.3), new(40.7, -74), new(-33.9, 151.2), new(-34, 18.5), new(1.3, 103.8),
    ];

    private static readonly Gen<Period> Periods = Gen.OneOf<Period>(
        Gen.Select(Gen.Int[-1, 10], Gen.Int[0, 12]).Select<(int First, int Count), Period>(
            range => new Period.Months(new YearMonth(2024, 11).AddMonths(range.First), new YearMonth(2024, 11).AddMonths(range.First + range.Count))),
        Gen.Select(Gen.Enum<Season>(), Any<(int?, int?)>((null, null), (2025, 2025), (2024, 2026)))
            .Select<(Season Season, (int?, int?) Years), Period>(season => new Period.SeasonOf(season.Season, season.Years.Item1, season.Years.Item2)));

    private static readonly Gen<HeatmapQuery> Queries =
        from period in Periods
        from selection in Any(("all", true), ("field-jo", true), ("station-0", false), ("station-3", false))
        from measure in Gen.Enum<Measure>()
        from statistic in Gen.Enum<Statistic>()
        from clock in Gen.Enum<HourClock>()
        from layer in Gen.Enum<BandLayer>()
        from interval in Gen.Enum<IntervalChoice>()
        from alignment in Gen.Enum<SeasonAlignment>()
        from vote in Gen.Enum<VoteUnit>()
        from days in Any(1, 1, 3, 20)
        from sweeps in Any(1, 1, 500)
        select new HeatmapQuery(selection.Item2 ? null : selection.Item1, selection.Item2 ? selection.Item1 : null, period)
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

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Every_kind_of_heatmap_equals_the_plain_computation_from_the_sheets(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var days = await FillAsync(store);
        var seen = 0;
        await Queries.SampleAsync(async query =>
        {
            var answer = Assert.IsType<HeatmapOutcome.Answered>(await store.Heatmaps.ReadAsync(query, Ct)).Answer;
            var selected = days.Where(day => query.Region is "all" || day.Station.Code.Equals(query.Station, StringComparison.Ordinal)
                || (query.Region is not null && day.Station.Square.Field.ToString() is "JO"));
            var plain = new PlainHeatmap(query, selected);
            foreach (var band in BandPlan.Standard.Layer(query.Layer))
            {
                seen += Compare(answer.Heatmap, band, plain);
            }
        }, iter: 150, threads: 1);
        Assert.True(seen > 10_000, $"only {seen} cells had data");
    }

    private static Gen<T> Any<T>(params T[] values) => Gen.Int[0, values.Length - 1].Select(i => values[i]);

    private static int Compare(Heatmap heatmap, Band band, PlainHeatmap plain)
    {
        var (row, observed) = (heatmap.Bands.ToList().FindIndex(shown => shown.Id == band.Id), 0);
        for (var hour = 0; hour < 24; hour++)
        {
            var expected = plain.Cell(band, hour);
            var cell = row < 0 ? new(double.NaN, double.NaN, double.NaN, 0, 0) : heatmap[row, hour];
            Assert.Equal((expected.Stations, expected.Days), (cell.Stations, cell.Days));
            Assert.Equal(expected.Value, cell.Value, 1e-9);
            observed += expected.Days > 0 ? 1 : 0;
        }

        Assert.Equal(observed > 0, row >= 0);
        return observed;
    }

    // Six stations, two of them in one square, over eleven months with gaps; a station with slices, one without signal.
    private static async Task<List<(Station Station, DateOnly Date, CellGrid Cells)>> FillAsync(TestStore store)
    {
        var all = new List<(Station Station, DateOnly Date, CellGrid Cells)>();
        for (var s = 0; s < Places.Length; s++)
        {
            var station = await store.AddStationAsync($"station-{s}", Places[s]);
            var dates = Enumerable.Range(0, 330).Where(d => (d * 7 + s) % (9 + s) == 0).Select(d => new DateOnly(2024, 11, 3).AddDays(d));
            var days = dates.Select((date, i) => (station, date, SampleSheets.Make(1000 * s + i, s == 1 ? 40 : 3, 0.7, signal: s != 2))).ToList();
            await store.BulkAsync(station, [.. days.Select(day => (day.date, day.Item3))]);
            all.AddRange(days);
        }

        return all;
    }
}
