using Bandtide.Core.Time;
using Bandtide.Storage.Coverage;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Coverage;

public sealed class CoverageReaderTests
{
    private static readonly YearMonth June = new(2026, 6);

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Each_station_has_one_entry_per_date(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var north = await store.AddStationAsync("north");
        var south = await store.AddStationAsync("south", new(-35, 20));
        var cells = SampleSheets.Make(1, bands: 3, presence: 0.1);
        await store.PutAsync(north, new(2026, 6, 1), cells);
        await store.PutAsync(north, new(2026, 6, 30), SampleSheets.Make(2, bands: 5));
        await store.PutAsync(north, new(2026, 7, 1), SampleSheets.Make(3));
        await store.PutAsync(south, new(2026, 6, 15), SampleSheets.Make(4));
        await store.Days.WithdrawAsync(south, new(2026, 6, 15), Ct);

        var answer = await store.Coverage.ReadAsync(null, "all", June, June, Ct);

        Assert.Equal(["north", "south"], answer!.Stations.Select(station => station.Code));
        Assert.Equal((new(2026, 6, 1), new(2026, 6, 30)), (answer.From, answer.To));
        Assert.All(answer.Days, days => Assert.Equal(30, days.Count));
        Assert.Equal(new CoverageDay(cells.HoursMask(), cells.Count, 3, false), answer.Days[0][0]);
        Assert.Equal(new CoverageDay(0xFFFFFF, 120, 5, false), answer.Days[0][29]);
        Assert.Equal(new CoverageDay(0, 0, 0, true), answer.Days[1][14]);
        Assert.Equal(3, answer.Days.Sum(days => days.Count(day => day is not null)));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task One_station_and_unknown_codes(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await store.AddStationAsync("north");
        await store.AddStationAsync("south", new(-35, 20));

        Assert.Equal(["south"], (await store.Coverage.ReadAsync("south", null, June, June, Ct))!.Stations.Select(station => station.Code));
        Assert.Equal(["south"], (await store.Coverage.ReadAsync(null, "field-kf", June, June, Ct))!.Stations.Select(station => station.Code));
        Assert.Empty((await store.Coverage.ReadAsync(null, "itu-2", June, June, Ct))!.Stations);
        Assert.Null(await store.Coverage.ReadAsync("west", null, June, June, Ct));
        Assert.Null(await store.Coverage.ReadAsync(null, "nowhere", June, June, Ct));
        Assert.Null(await store.Coverage.ReadAsync(null, null, June, June, Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_revision_moves_with_the_months_asked_for_and_with_the_network(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        var revisions = new List<string> { await RevisionAsync(store) };

        await store.PutAsync(station, new(2026, 6, 1), SampleSheets.Make(1));
        revisions.Add(await RevisionAsync(store));
        await store.PutAsync(station, new(2026, 7, 1), SampleSheets.Make(1));
        Assert.Equal(revisions[^1], await RevisionAsync(store));
        await store.AddStationAsync("south");
        revisions.Add(await RevisionAsync(store));

        Assert.Equal(3, revisions.Distinct(StringComparer.Ordinal).Count());
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_latest_report_tells_the_last_complete_date_and_who_reported(StoreKind kind)
    {
        var clock = new SettableClock(new(2026, 6, 10, 12, 0, 0, TimeSpan.Zero));
        await using var store = await TestStore.StartAsync(kind, clock);
        Assert.Null((await store.Coverage.LatestAsync(Ct)).LastCompleteDate);

        var (a, b, c) = (await store.AddStationAsync("a1"), await store.AddStationAsync("b1"), await store.AddStationAsync("c1"));
        await store.AddStationAsync("silent");
        await store.PutAsync(a, new(2026, 6, 10), SampleSheets.Make(1));
        await store.PutAsync(a, new(2026, 6, 8), SampleSheets.Make(2));
        await store.PutAsync(b, new(2026, 6, 8), SampleSheets.Make(3));
        await store.PutAsync(c, new(2026, 6, 1), SampleSheets.Make(4));
        await store.PutAsync(c, new(2026, 6, 9), SampleSheets.Make(5));
        await store.Days.WithdrawAsync(c, new(2026, 6, 9), Ct);

        var report = await store.Coverage.LatestAsync(Ct);

        Assert.Equal(new DateOnly(2026, 6, 8), report.LastCompleteDate);
        Assert.Equal(["a1", "b1"], report.Reporters.Select(station => station.Code));
        Assert.Equal([("a1", 10), ("b1", 8), ("c1", 1)], report.Newest.Select(newest => (newest.Station.Code, newest.Date.Day)));
        Assert.All(report.Newest, newest => Assert.Equal(clock.Now, newest.ReceivedAt));
    }

    private static async Task<string> RevisionAsync(TestStore store) => (await store.Coverage.ReadAsync("north", null, June, June, Ct))!.Revision;
}
