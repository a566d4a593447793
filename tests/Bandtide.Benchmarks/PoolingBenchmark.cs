using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;

namespace Bandtide.Benchmarks;

/// <summary>Pooling alone, from tiles and sheets that are in memory, unpacked: 1000 stations, 40 bands of one layer, one month.</summary>
internal static class PoolingBenchmark
{
    private const int Stations = 1000;
    private static readonly YearMonth Month = YearMonth.Of(ReferenceLoad.FirstDate);

    public static async Task RunAsync()
    {
        var plan = PlanOfForty();
        var stations = Enumerable.Range(0, Stations)
            .Select(n => new Station(n, $"station-{n:0000}", "Measured", new GeoPoint(-60 + (n % 120), -179 + (n * 7 % 358)), LevelUnit.DbMilliwatt, 1, [])).ToArray();

        // Eight different months of sheets, shared by all stations: those of a thousand would take 5 GB, and come unpacked from a warm cache anyway.
        var months = Enumerable.Range(0, 8).Select(n => Enumerable.Range(0, Month.Days)
            .Select(day => new DaySheet(ReferenceLoad.FirstDate.AddDays(day), Sheet(plan, n * 100 + day))).ToList()).ToArray();
        var tiles = stations.Select((_, n) => Copy(MonthTile.FromSheets(Measure.Occupancy, [.. months[n % months.Length].Select(day => day.Cells)])!)).ToArray();
        var query = new HeatmapQuery(null, "all", new Period.Months(Month, Month)) { Interval = IntervalChoice.None };

        await Bench.MedianAsync("mean of 1000 tiles", 200, () => FromTiles(query));
        await Bench.MedianAsync("the same, solar clock", 200, () => FromTiles(query with { Clock = HourClock.Solar }));
        await Bench.MedianAsync("the same, squares vote", 50, () => FromTiles(query with { Vote = VoteUnit.Square }));
        await Bench.MedianAsync("sd of 1000 tiles", 50, () => FromTiles(query with { Statistic = Statistic.Sd }));
        await Bench.MedianAsync("mean of 100 stations x 12 months of tiles", 200, () => FromTiles(query, 100, 12));
        await Bench.MedianAsync("packing of 1000 tiles", 10, () => Repeat(tiles, tile => MonthTileCodec.Encode(tile).Length));
        var packed = tiles.Select(MonthTileCodec.Encode).ToArray();
        await Bench.MedianAsync("unpacking of 1000 tiles", 20, () => Repeat(packed, bytes => MonthTileCodec.Decode(bytes).BandCount));
        await Bench.MedianAsync("seven measures' tiles of one month from 31 sheets", 50, () => Repeat(Measures.All, info => MonthTile.FromSheets(info.Measure, [.. months[0].Select(day => day.Cells)])?.BandCount ?? 0));
        foreach (var count in new[] { 100, Stations })
        {
            await Bench.MedianAsync($"mean with interval, {count} stations' sheets", 7, () => FromSheets(query with { Interval = IntervalChoice.Auto }, count));
            await Bench.MedianAsync($"mean with interval of level, {count} stations' sheets", 7, () => FromSheets(query with { Interval = IntervalChoice.Auto, Measure = Measure.Level }, count));
            await Bench.MedianAsync($"median, {count} stations' sheets", 7, () => FromSheets(query with { Statistic = Statistic.Median }, count));
            await Bench.MedianAsync($"minsweeps, {count} stations' sheets", 7, () => FromSheets(query with { MinSweeps = 400 }, count));
        }

        Task FromTiles(HeatmapQuery asked, int count = Stations, int length = 1)
        {
            var pool = new TilePool(asked, plan);
            for (var n = 0; n < count; n++)
            {
                pool.Add(stations[n], [.. Enumerable.Range(0, length).Select(i => (Month.AddMonths(i), tiles[(n + i) % tiles.Length]))]);
            }

            return Check(pool.ToHeatmap());
        }

        Task FromSheets(HeatmapQuery asked, int count)
        {
            var pool = new DayPool(asked, plan);
            for (var n = 0; n < count; n++)
            {
                pool.Add(stations[n], months[n % months.Length]);
            }

            return Check(pool.ToHeatmap());
        }
    }

    private static Task Check(Heatmap heatmap) => heatmap.Bands.Count == ReferenceLoad.Bands
        ? Task.CompletedTask : throw new InvalidOperationException($"{heatmap.Bands.Count} bands");

    private static Task Repeat<T>(IEnumerable<T> items, Func<T, int> work) =>
        items.Sum(work) > 0 ? Task.CompletedTask : throw new InvalidOperationException("Nothing was done.");

    private static MonthTile Copy(MonthTile tile) => new(tile.BandIds.ToArray(), tile.Days.ToArray(), tile.Sums.ToArray());

    // The service layer with seven bands more, below and between the others.
    private static BandPlan PlanOfForty()
    {
        var added = Enumerable.Range(0, ReferenceLoad.Bands - BandPlan.Standard.Layer(BandLayer.Service).Count).Select(n => new Band(
            (short)(BandPlan.FirstAddedId + n), $"extra-{n}", BandLayer.Service, "Another band", [new FrequencySegment(300_000 + n * 10_000, 310_000 + n * 10_000)]));
        return BandPlan.Standard.With(added).Plan ?? throw new InvalidOperationException("The plan refuses the bands.");
    }

    private static CellGrid Sheet(BandPlan plan, int seed)
    {
        short[] ids = [.. plan.Layer(BandLayer.Service).Select(band => band.Id).Order()];
        var sheet = ReferenceLoad.Sheet(seed);
        return new(ids, [.. Enum.GetValues<Quantity>().Select(quantity => sheet.Plane(quantity) is { IsEmpty: false } plane ? plane.ToArray() : null)]);
    }
}
