using Bandtide.Core.Bands;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Network;

public sealed class BandTests
{
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task An_added_band_joins_the_plan_of_every_instance(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var second = store.OpenAgain();
        Assert.Equal(BandPlan.Standard.All.Count, (await second.Network.GetAsync(Ct)).Plan.All.Count);

        var added = Assert.IsType<BandAddition.Added>(await store.Network.AddBandAsync(
            BandLayer.Service, "mar-8", "8 MHz maritime", [new(8_600_000, 8_815_000), new(8_195_000, 8_300_000)], Ct)).Band;

        Assert.Equal(BandPlan.FirstAddedId, added.Id);
        Assert.True((await second.Network.GetAsync(Ct)).Plan.TryGet("mar-8", out var found));
        Assert.Equal(added, found);
        Assert.Equal(8_195_000, found.LowHz);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Of_two_rivals_for_the_same_frequencies_one_is_refused(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);

        var outcomes = await Task.WhenAll(new[] { "mar-a", "mar-b" }.Select(code => Task.Run(() =>
            store.Network.AddBandAsync(BandLayer.Service, code, "Maritime", [new(8_195_000, 8_300_000)], Ct))));

        Assert.Single(outcomes.OfType<BandAddition.Added>());
        Assert.Equal("overlap", Assert.Single(Assert.Single(outcomes.OfType<BandAddition.Refused>()).Problems).Rule);
    }
}
