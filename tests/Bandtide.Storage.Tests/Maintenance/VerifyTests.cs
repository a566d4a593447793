using Bandtide.Core.Stations;
using Bandtide.Storage.Maintenance;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Maintenance;

/// <summary>Each kind of damage is done by hand and must be found, and nothing else.</summary>
public sealed class VerifyTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);

    // 2026-06-03, days since 1970-01-01 (date -d 2026-06-03 +%s, divided by 86400).
    private const int June3 = 20607;

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_sound_store_is_counted_through(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);

        var report = await store.Maintenance.VerifyAsync(Ct);

        Assert.Empty(report.Faults);

        // Five days, one of them replaced twice, one withdrawn; six measures without "steady".
        Assert.Equal((1, 4, 3, 6), (report.Stations, report.Sheets, report.Revisions, report.Tiles));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Every_byte_of_a_sheet_matters(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        var sheet = (byte[])(await store.SqlAsync($"SELECT sheet FROM day_sheet WHERE date = {June3}"))!;
        foreach (var place in Enumerable.Range(0, 12).Select(i => i * (sheet.Length - 1) / 11))
        {
            var damaged = (byte[])sheet.Clone();
            damaged[place] ^= 0x10;
            await store.SqlAsync($"UPDATE day_sheet SET sheet = {Literal(kind, damaged)} WHERE date = {June3}");

            var fault = (await store.Maintenance.VerifyAsync(Ct)).Faults[0];

            Assert.Equal(("north", "2026-06-03"), (fault.Station, fault.Place));
        }
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_sheet_cut_short_is_named(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        var sheet = (byte[])(await store.SqlAsync($"SELECT sheet FROM day_sheet WHERE date = {June3}"))!;
        foreach (var length in new[] { 0, 1, sheet.Length / 2, sheet.Length - 1 })
        {
            await store.SqlAsync($"UPDATE day_sheet SET sheet = {Literal(kind, sheet[..length])} WHERE date = {June3}");

            Assert.Equal("2026-06-03", Assert.Single((await store.Maintenance.VerifyAsync(Ct)).Faults).Place);
        }
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Exchanged_sheets_do_not_match_their_checksums(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        await store.SqlAsync($"UPDATE day_sheet SET sheet = (SELECT sheet FROM day_sheet WHERE date = {June3 + 1}) WHERE date = {June3}");

        var places = (await store.Maintenance.VerifyAsync(Ct)).Faults.Select(fault => fault.Place).ToList();

        Assert.Contains("2026-06-03", places);
        Assert.Contains("2026-06", places);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Wrong_counts_are_found(StoreKind kind)
    {
        foreach (var column in new[] { "cell_count", "hours_mask", "band_count" })
        {
            await using var store = await FilledAsync(kind);
            await store.SqlAsync($"UPDATE day_sheet SET {column} = {column} + 1 WHERE date = {June3}");
            Assert.Equal("2026-06-03", Assert.Single((await store.Maintenance.VerifyAsync(Ct)).Faults).Place);
        }
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_tile_that_differs_is_missing_or_has_no_sheets_is_found_and_a_rebuild_mends_it(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        var tiles = await store.TilesAsync((await store.Network.GetAsync(Ct)).FindStation("north")!);
        await store.SqlAsync("UPDATE month_tile SET tile = (SELECT tile FROM month_tile WHERE measure = 1) WHERE measure = 0");
        await store.SqlAsync("DELETE FROM month_tile WHERE measure = 5");
        await store.SqlAsync("INSERT INTO month_tile (station_id, month, measure, tile) SELECT station_id, 24320, 0, tile FROM month_tile WHERE measure = 1");

        var faults = (await store.Maintenance.VerifyAsync(Ct)).Faults;
        Assert.Equal(["2026-06", "2026-06", "2026-09"], faults.Select(fault => fault.Place).Order(StringComparer.Ordinal));

        var progress = new List<RebuildProgress>();
        await store.Maintenance.RebuildAsync(new Recorder(progress), Ct);
        Assert.Equal(new RebuildProgress(1, 1, 2), progress[^1]);
        await store.AssertSoundAsync();
        Assert.Equal(tiles, await store.TilesAsync((await store.Network.GetAsync(Ct)).FindStation("north")!));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_gap_in_the_revisions_is_found(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        await store.SqlAsync("DELETE FROM day_revision WHERE revision = 1 AND date <> 20609");

        Assert.All((await store.Maintenance.VerifyAsync(Ct)).Faults, fault => Assert.Equal("2026-06-01", fault.Place));
        Assert.NotEmpty((await store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_damaged_earlier_revision_is_named(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        await store.SqlAsync($"UPDATE day_revision SET sheet = {Literal(kind, [1, 2, 3])} WHERE revision = 2");

        Assert.Equal("2026-06-01", Assert.Single((await store.Maintenance.VerifyAsync(Ct)).Faults).Place);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_day_with_earlier_revisions_but_no_current_one_is_found(StoreKind kind)
    {
        await using var store = await FilledAsync(kind);
        await store.SqlAsync("DELETE FROM day_sheet WHERE date = 20609");

        Assert.Equal("2026-06-05", Assert.Single((await store.Maintenance.VerifyAsync(Ct)).Faults).Place);
    }

    // Five days in June; the first replaced twice, the last withdrawn.
    private static async Task<TestStore> FilledAsync(StoreKind kind)
    {
        var store = await TestStore.StartAsync(kind);
        Station station = await store.AddStationAsync("north");
        await store.BulkAsync(station, [.. Enumerable.Range(0, 5).Select(i => (June1.AddDays(i), SampleSheets.Make(i, presence: 0.8)))]);
        await store.PutAsync(station, June1, SampleSheets.Make(10));
        await store.PutAsync(station, June1, SampleSheets.Make(11));
        await store.Days.WithdrawAsync(station, June1.AddDays(4), Ct);
        return store;
    }

    private static string Literal(StoreKind kind, byte[] bytes) =>
        kind == StoreKind.Sqlite ? $"x'{Convert.ToHexString(bytes)}'" : $"'\\x{Convert.ToHexString(bytes)}'::bytea";

    private sealed class Recorder(List<RebuildProgress> list) : IProgress<RebuildProgress>
    {
        public void Report(RebuildProgress value) => list.Add(value);
    }
}
