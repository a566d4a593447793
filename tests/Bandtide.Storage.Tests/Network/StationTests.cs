using Bandtide.Core.Geography;
using Bandtide.Core.Stations;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Network;

public sealed class StationTests
{
    private static readonly GeoPoint Minsk = new(53.9, 27.56);

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_station_is_kept_as_given_and_its_ITU_Region_guessed(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);

        var station = await store.AddStationAsync("minsk-1", Minsk, LevelUnit.DbMicrovoltPerMetre);

        var found = (await store.Network.GetAsync(Ct)).FindStation("minsk-1");
        Assert.Equal(station.Id, found?.Id);
        Assert.Equal(("Station minsk-1", Minsk, LevelUnit.DbMicrovoltPerMetre, 1), (found!.Name, found.Position, found.Unit, found.ItuRegion));
        Assert.Empty(found.Setups);
        Assert.Null((await store.Network.GetAsync(Ct)).FindStation("minsk-2"));
        Assert.Null((await store.Network.GetAsync(Ct)).FindStation("MINSK-1"));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_code_is_taken_once_also_by_rivals(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);

        var outcomes = await Task.WhenAll(Enumerable.Range(0, 8).Select(_ =>
            Task.Run(() => store.Network.CreateStationAsync(new("minsk-1", "Minsk", Minsk, LevelUnit.DbMilliwatt, []), Ct))));

        Assert.Single(outcomes.OfType<StationCreation.Created>());
        Assert.Equal(7, outcomes.OfType<StationCreation.DuplicateCode>().Count());
        Assert.Single((await store.Network.GetAsync(Ct)).Stations);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_operators_word_on_the_ITU_Region_stands_above_the_guess(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);

        Assert.Equal(3, (await store.AddStationAsync("minsk-1", Minsk, regions: "itu-3")).ItuRegion);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_region_that_does_not_exist_or_lies_elsewhere_refuses_the_station(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await store.Network.CreateRegionAsync(new("islands", "Islands", [], null), Ct);

        var outcome = await store.Network.CreateStationAsync(
            new("minsk-1", "Minsk", Minsk, LevelUnit.DbMilliwatt, ["islands", "nowhere", "field-jo", "square-ko33", "all", "itu-1"]), Ct);

        Assert.Equal(["nowhere", "field-jo"], Assert.IsType<StationCreation.RefusedRegions>(outcome).Codes);
        Assert.Empty((await store.Network.GetAsync(Ct)).Stations);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Setups_come_back_by_date_and_the_later_entry_of_a_date_counts(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("minsk-1", Minsk);
        var full = new Setup(
            new(2026, 3, 1), "floor+margin", 5.5, 8, Detector.Log, 100, 150.5, 5, 12.3, "rural", "a receiver", "an antenna", "a note");
        await store.Network.AddSetupAsync(station, full, Ct);
        await store.Network.AddSetupAsync(station, new(new(2025, 1, 1), MarginDb: 4), Ct);
        await store.Network.AddSetupAsync(station, new(new(2025, 1, 1), MarginDb: 6), Ct);

        var found = (await store.Network.GetAsync(Ct)).FindStation("minsk-1")!;

        Assert.Equal([4, 6, 5.5], found.Setups.Select(setup => setup.MarginDb!.Value));
        Assert.Equal(full, found.SetupOn(new(2026, 3, 1)));
        Assert.Equal(6, found.SetupOn(new(2026, 2, 28))!.MarginDb);
        Assert.Null(found.SetupOn(new(2024, 12, 31)));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_change_made_elsewhere_is_seen_at_once(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var second = store.OpenAgain();
        var before = await second.Network.GetAsync(Ct);
        Assert.Same(before, await second.Network.GetAsync(Ct));

        await store.AddStationAsync("minsk-1", Minsk);

        var after = await second.Network.GetAsync(Ct);
        Assert.NotNull(after.FindStation("minsk-1"));
        Assert.True(after.Version > before.Version);
    }
}
