using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;

namespace Bandtide.Benchmarks;

/// <summary>Heatmaps over 100 and 1000 stations, from the store and from memory, and the size of it all on disk.</summary>
internal static class HeatmapBenchmarks
{
    private const int Months = 12;

    /// <summary>Loads stations for a month (the first hundred of them for a year) and times the questions.</summary>
    public static async Task RunAsync(StoreKind kind, int stations)
    {
        await using var store = await TestStore.StartAsync(kind);
        await LoadAsync(store, stations);
        var month = YearMonth.Of(ReferenceLoad.FirstDate);
        var one = new Period.Months(month, month);
        await TimeAsync(store, $"mean, {stations} stations, 1 month, {kind}", new(null, "all", one) { Interval = IntervalChoice.None });
        await TimeAsync(store, $"mean, 100 stations, 1 month, {kind}", new(null, "hundred", one) { Interval = IntervalChoice.None });
        await TimeAsync(store, $"mean, 100 stations, 12 months, {kind}", new(null, "hundred", new Period.Months(month, month.AddMonths(Months - 1))) { Interval = IntervalChoice.None });
        await TimeAsync(store, $"interval, 100 stations, 1 month, {kind}", new(null, "hundred", one));
        await TimeAsync(store, $"interval, {stations} stations, 1 month, {kind}", new(null, "all", one));
        await TimeAsync(store, $"median, 100 stations, 1 month, {kind}", new(null, "hundred", one) { Statistic = Statistic.Median });
        await TimeAsync(store, $"median, {stations} stations, 1 month, {kind}", new(null, "all", one) { Statistic = Statistic.Median });
        await SizeAsync(store, stations);
    }

    private static async Task LoadAsync(TestStore store, int stations)
    {
        for (var n = 0; n < stations; n++)
        {
            var made = (StationCreation.Created)await store.Network.CreateStationAsync(
                new($"station-{n:0000}", $"Station {n}", new GeoPoint(-60 + (n % 120), -179 + (n * 7 % 358)), LevelUnit.DbMilliwatt, []), CancellationToken.None);
            await store.Days.StoreAsync(made.Station, ReferenceLoad.Days(n, 0, n < 100 ? 366 : 31), restoreWithdrawn: false, CancellationToken.None);
        }

        await store.Network.CreateRegionAsync(new("hundred", "A hundred", [.. Enumerable.Range(0, 100).Select(n => $"station-{n:0000}")], null), CancellationToken.None);
    }

    // Uncached: a second set of services knows nothing yet. Cached: the same services again.
    private static async Task TimeAsync(TestStore store, string name, HeatmapQuery query)
    {
        await Bench.MedianAsync($"{name}, from the store", 7, async () =>
        {
            await using var fresh = store.OpenAgain();
            await AskAsync(fresh, query);
        });
        await Bench.MedianAsync($"{name}, in memory", 50, () => AskAsync(store, query));
    }

    private static async Task AskAsync(TestStore store, HeatmapQuery query)
    {
        if (await store.Heatmaps.ReadAsync(query, CancellationToken.None) is not HeatmapOutcome.Answered { Answer.Heatmap.Bands.Count: > 0 })
        {
            throw new InvalidOperationException("There should be an answer.");
        }
    }

    private static async Task SizeAsync(TestStore store, int stations)
    {
        var bandHours = (100L * 366 + (stations - 100) * 31L) * 24 * ReferenceLoad.Bands;
        var bytes = store.Kind == StoreKind.Sqlite
            ? await SqliteBytesAsync(store)
            : Convert.ToInt64(await store.SqlAsync("VACUUM FULL; SELECT sum(pg_total_relation_size(c.oid))::bigint FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace WHERE n.nspname = 'public' AND c.relkind = 'r'"), System.Globalization.CultureInfo.InvariantCulture);
        Bench.Say($"| disk, {store.Kind} | {(double)bytes / bandHours:0.00} bytes per band-hour | {bytes / 1e6:0} MB, {bandHours / 1e6:0.0} million band-hours of five quantities, indexes and tiles included |");
    }

    private static async Task<long> SqliteBytesAsync(TestStore store)
    {
        await store.SqlAsync("PRAGMA wal_checkpoint(TRUNCATE)");
        return new FileInfo(store.Options.FilePath).Length;
    }
}
