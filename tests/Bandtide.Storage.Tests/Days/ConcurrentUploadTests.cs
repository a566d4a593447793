using Bandtide.Storage.Days;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Days;

public sealed class ConcurrentUploadTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Uploads_to_one_month_from_many_tasks_lose_nothing(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var second = store.OpenAgain();
        var station = await store.AddStationAsync("north");

        var receipts = await Task.WhenAll(Enumerable.Range(0, 30).Select(i =>
            Task.Run(() => (i % 2 == 0 ? store : second).PutAsync(station, June1.AddDays(i), SampleSheets.Make(i)))));

        Assert.All(receipts, receipt => Assert.Equal(DayStatus.Created, receipt.Status));
        Assert.Equal(30, (await store.Days.ListAsync(station, null, null, Ct)).Count);
        await store.AssertSoundAsync();
        var fresh = await store.AddStationAsync("fresh");
        await store.BulkAsync(fresh, [.. Enumerable.Range(0, 30).Select(i => (June1.AddDays(i), SampleSheets.Make(i)))]);
        Assert.Equal(await store.TilesAsync(fresh), await store.TilesAsync(station));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Writers_of_one_day_get_revisions_without_gap(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");

        var receipts = await Task.WhenAll(Enumerable.Range(0, 20).Select(i =>
            Task.Run(() => store.PutAsync(station, June1, SampleSheets.Make(i)))));

        Assert.Equal(Enumerable.Range(1, 20), receipts.Select(receipt => receipt.Revision).Order());
        Assert.Equal(20, (await store.Days.RevisionsAsync(station, June1, Ct)).Count);
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Stations_that_write_the_same_months_in_any_order_do_not_block_each_other(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var stations = await Task.WhenAll(Enumerable.Range(0, 6).Select(i => store.AddStationAsync($"station-{i}")));

        await Task.WhenAll(stations.SelectMany(station => Enumerable.Range(0, 5).Select(round => Task.Run(() => store.BulkAsync(
            station,
            [.. Enumerable.Range(0, 12).OrderBy(month => (month * 7 + round * 5 + station.Id) % 12)
                .Select(month => (new DateOnly(2025, month + 1, 1 + round), SampleSheets.Make(month + 100 * round)))])))));

        await store.AssertSoundAsync();
        Assert.Equal(30L, Convert.ToInt64(await store.SqlAsync("SELECT counter FROM month_change WHERE month = 24300"), null));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_cancelled_upload_stores_all_or_nothing(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        for (var i = 0; i < 20; i++)
        {
            using var cancel = new CancellationTokenSource(TimeSpan.FromMilliseconds(i));
            PendingDay[] days = [.. Enumerable.Range(0, 20).Select(day => Day(June1.AddDays(day + 100 * i), SampleSheets.Make(day + i)))];
            int stored;
            try
            {
                stored = (await store.Days.StoreAsync(station, days, false, cancel.Token)).Count;
            }
            catch (OperationCanceledException)
            {
                stored = 0;
            }

            var present = await store.Days.ListAsync(station, days[0].Sheet.Date, days[^1].Sheet.Date, Ct);
            Assert.Equal(stored, present.Count);
        }

        await store.AssertSoundAsync();
    }
}
