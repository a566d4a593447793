using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;
namespace Bandtide.Storage.Tests;
public sealed class Smoke
{
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Works(StoreKind kind)
    {
        var ct = Xunit.TestContext.Current.CancellationToken;
        await using var store = await TestStore.StartAsync(kind);
        var made = Assert.IsType<StationCreation.Created>(await store.Network.CreateStationAsync(new("abc", "A", new(1, 2), LevelUnit.DbMilliwatt, []), ct));
        var r = await store.Days.StoreAsync(made.Station, [.. Enumerable.Range(0, 40).Select(i => new Storage.Days.PendingDay(new(new DateOnly(2026, 1, 1).AddDays(i), SampleSheets.Make(i)), []))], false, ct);
        Assert.All(r, x => Assert.Equal(1, x.Revision));
        await store.Days.StoreAsync(made.Station, [.. Enumerable.Range(0, 10).Select(i => new Storage.Days.PendingDay(new(new DateOnly(2026, 1, 1).AddDays(i), SampleSheets.Make(i+5)), []))], false, ct);
        Assert.True(await store.Days.WithdrawAsync(made.Station, new(2026, 1, 3), ct));
        var v = await store.Maintenance.VerifyAsync(ct);
        Assert.Empty(v.Faults);
        Assert.Equal(39, v.Sheets);
        Assert.Equal(11, v.Revisions);
    }
}
