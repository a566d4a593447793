using Bandtide.Core.Geography;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Network;

public sealed class RegionTests
{
    private static readonly GeoPoint Minsk = new(53.9, 27.56);
    private static readonly GeoPoint Vilnius = new(54.69, 25.28);
    private static readonly GeoPoint Perth = new(-31.95, 115.86);

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Regions_that_exist_by_themselves_follow_the_stations(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var empty = await store.Network.GetAsync(Ct);
        Assert.Equal(["all"], empty.Regions.Select(region => region.Code));
        Assert.Empty(empty.FindRegion("itu-2")!.Stations);

        await store.AddStationAsync("minsk", Minsk);
        await store.AddStationAsync("vilnius", Vilnius);
        await store.AddStationAsync("perth", Perth);

        var network = await store.Network.GetAsync(Ct);
        Assert.Equal(
            ["all", "field-ko", "field-of", "itu-1", "itu-3", "square-ko24", "square-ko33", "square-of78"],
            network.Regions.Select(region => region.Code));
        Assert.Equal("minsk perth vilnius", Members(network, "all"));
        Assert.Equal("minsk vilnius", Members(network, "field-ko"));
        Assert.Equal("minsk", Members(network, "square-ko33"));
        Assert.Equal("minsk vilnius", Members(network, "itu-1"));
        Assert.Equal("", Members(network, "itu-2"));
        Assert.Null(network.FindRegion("field-jn"));
        Assert.Null(network.FindRegion("square-ko00"));
        Assert.Null(network.FindRegion("itu-4"));
        Assert.Equal(["KO33"], network.FindRegion("square-ko33")!.Locators);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_list_holds_its_stations_and_those_that_join_it(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await store.AddStationAsync("minsk", Minsk);

        var made = Assert.IsType<RegionCreation.Created>(
            await store.Network.CreateRegionAsync(new("baltic", "Around the Baltic", ["minsk", "minsk"], null), Ct)).Region;
        Assert.Equal((RegionKind.List, "Around the Baltic", 1), (made.Kind, made.Name, made.Stations.Count));

        await store.AddStationAsync("vilnius", Vilnius, regions: "baltic");
        await store.AddStationAsync("perth", Perth);
        Assert.Equal("minsk vilnius", Members(await store.Network.GetAsync(Ct), "baltic"));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Locators_gather_stations_by_position_also_later_ones(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var made = Assert.IsType<RegionCreation.Created>(
            await store.Network.CreateRegionAsync(new("mixed", "Mixed", null, ["ko33", "OF"]), Ct)).Region;
        Assert.Equal(["KO33", "OF"], made.Locators);

        await store.AddStationAsync("minsk", Minsk);
        await store.AddStationAsync("vilnius", Vilnius);
        await store.AddStationAsync("perth", Perth, regions: "mixed");

        Assert.Equal("minsk perth", Members(await store.Network.GetAsync(Ct), "mixed"));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Every_reason_against_a_region_is_an_outcome(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await store.AddStationAsync("minsk", Minsk);
        await store.Network.CreateRegionAsync(new("taken", "Taken", ["minsk"], null), Ct);
        var version = (await store.Network.GetAsync(Ct)).Version;

        foreach (var code in new[] { "taken", "all", "itu-1", "itu-9", "field-jo", "square-jo62" })
        {
            Assert.IsType<RegionCreation.DuplicateCode>(await store.Network.CreateRegionAsync(new(code, "x", ["minsk"], null), Ct));
        }

        Assert.Equal(
            ["perth"], Assert.IsType<RegionCreation.UnknownStations>(await store.Network.CreateRegionAsync(new("new", "x", ["minsk", "perth"], null), Ct)).Codes);
        Assert.Equal(
            ["ZZ", "KO33aa"], Assert.IsType<RegionCreation.InvalidLocators>(await store.Network.CreateRegionAsync(new("new", "x", null, ["KO", "ZZ", "KO33aa"]), Ct)).Texts);
        Assert.IsType<RegionCreation.NeitherOrBoth>(await store.Network.CreateRegionAsync(new("new", "x", null, null), Ct));
        Assert.IsType<RegionCreation.NeitherOrBoth>(await store.Network.CreateRegionAsync(new("new", "x", ["minsk"], ["KO"]), Ct));
        Assert.Equal(version, (await store.Network.GetAsync(Ct)).Version);
    }

    private static string Members(NetworkView network, string code) => string.Join(' ', network.FindRegion(code)!.Stations.Select(station => station.Code));
}
