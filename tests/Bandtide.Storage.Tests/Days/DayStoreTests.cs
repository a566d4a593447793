using Bandtide.Storage.Days;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Days;

public sealed class DayStoreTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);
    private static readonly DateOnly June2 = new(2026, 6, 2);

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_first_upload_creates_revision_one_and_reads_back_as_sent(StoreKind kind)
    {
        var clock = new SettableClock(new(2026, 6, 2, 8, 30, 0, TimeSpan.Zero));
        await using var store = await TestStore.StartAsync(kind, clock);
        var station = await store.AddStationAsync("north");
        var cells = SampleSheets.Make(1, presence: 0.7);

        var receipt = await store.PutAsync(station, June1, cells);

        Assert.Equal(("north", June1, DayStatus.Created, 1, cells.Count), (receipt.Station, receipt.Date, receipt.Status, receipt.Revision, receipt.Cells));
        var found = await store.Days.FindAsync(station, June1, null, Ct);
        AssertSameCells(cells, found?.Sheet);
        Assert.Equal((1, receipt.Checksum, cells.Count, clock.Now, false), (found!.Revision, found.Checksum, found.Cells, found.ReceivedAt, found.IsWithdrawal));
        Assert.Null(await store.Days.FindAsync(station, June2, null, Ct));
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_same_cells_again_store_nothing(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        var first = await store.PutAsync(station, June1, SampleSheets.Make(1));

        var again = await store.PutAsync(station, June1, SampleSheets.Make(1));

        Assert.Equal((DayStatus.Unchanged, 1, first.Checksum), (again.Status, again.Revision, again.Checksum));
        Assert.Single(await store.Days.RevisionsAsync(station, June1, Ct));
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Other_cells_replace_the_day_and_the_old_revision_stays_readable(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1, SampleSheets.Make(1));

        var receipt = await store.PutAsync(station, June1, SampleSheets.Make(2));

        Assert.Equal((DayStatus.Replaced, 2), (receipt.Status, receipt.Revision));
        AssertSameCells(SampleSheets.Make(2), (await store.Days.FindAsync(station, June1, null, Ct))?.Sheet);
        AssertSameCells(SampleSheets.Make(2), (await store.Days.FindAsync(station, June1, 2, Ct))?.Sheet);
        AssertSameCells(SampleSheets.Make(1), (await store.Days.FindAsync(station, June1, 1, Ct))?.Sheet);
        Assert.Null(await store.Days.FindAsync(station, June1, 3, Ct));
        Assert.Equal([1, 2], (await store.Days.RevisionsAsync(station, June1, Ct)).Select(day => day.Revision));
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Withdrawing_is_a_revision_and_happens_once(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1, SampleSheets.Make(1));

        Assert.Null(await store.Days.WithdrawAsync(station, June2, Ct));
        Assert.True(await store.Days.WithdrawAsync(station, June1, Ct));
        Assert.False(await store.Days.WithdrawAsync(station, June1, Ct));

        var current = await store.Days.FindAsync(station, June1, null, Ct);
        Assert.Equal((2, "", 0, true), (current!.Revision, current.Checksum, current.Cells, current.IsWithdrawal));
        Assert.Null(current.Sheet);
        Assert.Equal([false, true], (await store.Days.RevisionsAsync(station, June1, Ct)).Select(day => day.IsWithdrawal));
        AssertSameCells(SampleSheets.Make(1), (await store.Days.FindAsync(station, June1, 1, Ct))?.Sheet);
        Assert.Equal("", await store.TilesAsync(station));
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_withdrawn_day_stays_withdrawn_unless_it_is_restored(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1, SampleSheets.Make(1));
        await store.Days.WithdrawAsync(station, June1, Ct);

        var kept = Assert.Single(await store.BulkAsync(station, (June1, SampleSheets.Make(1))));
        Assert.Equal((DayStatus.Withdrawn, 2), (kept.Status, kept.Revision));
        Assert.True((await store.Days.FindAsync(station, June1, null, Ct))!.IsWithdrawal);

        // The same cells as before the withdrawal are a new revision all the same.
        var restored = await store.PutAsync(station, June1, SampleSheets.Make(1));
        Assert.Equal((DayStatus.Created, 3), (restored.Status, restored.Revision));
        Assert.Equal([1, 2, 3], (await store.Days.RevisionsAsync(station, June1, Ct)).Select(day => day.Revision));
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task One_call_stores_many_days_and_answers_in_their_order(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1, SampleSheets.Make(1));
        await store.PutAsync(station, June2, SampleSheets.Make(2));
        await store.PutAsync(station, new(2026, 7, 1), SampleSheets.Make(3));
        await store.Days.WithdrawAsync(station, new(2026, 7, 1), Ct);

        var receipts = await store.BulkAsync(
            station,
            (new(2026, 7, 1), SampleSheets.Make(3)),
            (June2, SampleSheets.Make(20)),
            (new(2026, 5, 31), SampleSheets.Make(4)),
            (June1, SampleSheets.Make(1)));

        Assert.Equal(
            [DayStatus.Withdrawn, DayStatus.Replaced, DayStatus.Created, DayStatus.Unchanged], receipts.Select(receipt => receipt.Status));
        Assert.Equal([2, 2, 1, 1], receipts.Select(receipt => receipt.Revision));
        Assert.Equal(
            [new(2026, 5, 31), June1, June2], (await store.Days.ListAsync(station, null, null, Ct)).Select(day => day.Date));
        await store.AssertSoundAsync();
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_list_holds_both_ends_and_no_withdrawn_day(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        var other = await store.AddStationAsync("south");
        await store.BulkAsync(station, [.. Enumerable.Range(0, 10).Select(i => (June1.AddDays(i), SampleSheets.Make(i)))]);
        await store.PutAsync(other, June2, SampleSheets.Make(99));
        await store.Days.WithdrawAsync(station, June1.AddDays(4), Ct);

        var days = await store.Days.ListAsync(station, June1.AddDays(2), June1.AddDays(6), Ct);

        Assert.Equal([3, 4, 6, 7], days.Select(day => day.Date.Day));
        Assert.All(days, day => Assert.Null(day.Sheet));
        Assert.All(days, day => Assert.Equal(32, day.Checksum.Length));
        Assert.Empty(await store.Days.ListAsync(station, June1.AddDays(20), null, Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_date_twice_in_one_call_is_a_mistake_of_the_caller(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");

        await Assert.ThrowsAsync<ArgumentException>(() => store.BulkAsync(station, (June1, SampleSheets.Make(1)), (June1, SampleSheets.Make(2))));
        Assert.Empty(await store.Days.ListAsync(station, null, null, Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Dates_before_1970_are_days_like_any_other(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        DateOnly[] dates = [new(1950, 1, 1), new(1969, 12, 31), new(1970, 1, 1)];

        await store.BulkAsync(station, [.. dates.Select((date, i) => (date, SampleSheets.Make(i)))]);

        Assert.Equal(dates, (await store.Days.ListAsync(station, null, null, Ct)).Select(day => day.Date));
        await store.AssertSoundAsync();
    }
}
