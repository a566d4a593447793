using Bandtide.Core.Sheets;
using Bandtide.Storage.Days;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Days;

public sealed class CopiedDayTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_copy_of_an_earlier_day_is_stored_and_warned_about(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1, SampleSheets.Make(1));

        var copy = await store.PutAsync(station, June1.AddDays(1), SampleSheets.Make(1));

        Assert.Equal(DayStatus.Created, copy.Status);
        Assert.Contains("2026-06-01", Copy(copy)!.Message, StringComparison.Ordinal);

        // Sent again it is unchanged, and as suspicious as before.
        Assert.NotNull(Copy(await store.PutAsync(station, June1.AddDays(1), SampleSheets.Make(1))));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_later_day_another_station_and_a_withdrawn_day_are_no_originals(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        var other = await store.AddStationAsync("south");
        await store.PutAsync(station, June1.AddDays(5), SampleSheets.Make(1));
        await store.PutAsync(other, June1, SampleSheets.Make(1));
        await store.PutAsync(station, June1.AddDays(1), SampleSheets.Make(2));
        await store.Days.WithdrawAsync(station, June1.AddDays(1), Ct);

        Assert.Null(Copy(await store.PutAsync(station, June1, SampleSheets.Make(1))));
        Assert.Null(Copy(await store.PutAsync(station, June1.AddDays(2), SampleSheets.Make(2))));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Within_one_call_the_earliest_date_is_the_original_whatever_the_order(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1.AddDays(9), SampleSheets.Make(7));

        var receipts = await store.BulkAsync(
            station,
            (June1.AddDays(2), SampleSheets.Make(1)),
            (June1, SampleSheets.Make(1)),

            // Replaced in this very call, so that it no longer is what the next one copies.
            (June1.AddDays(9), SampleSheets.Make(8)),
            (June1.AddDays(10), SampleSheets.Make(7)));

        Assert.Equal([true, false, false, false], receipts.Select(receipt => Copy(receipt) is not null));
        Assert.Contains("2026-06-01", Copy(receipts[0])!.Message, StringComparison.Ordinal);
    }

    private static SheetWarning? Copy(DayReceipt receipt) => receipt.Warnings.SingleOrDefault(warning => warning.Rule is SheetRule.CopiedDay);
}
