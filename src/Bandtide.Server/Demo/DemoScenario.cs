namespace Bandtide.Server.Demo;

/// <summary>The invented scenario: a listener club of sixteen stations on five continents. Nothing in it was ever measured.</summary>
internal static class DemoScenario
{
    /// <summary>Code of the region that lists its stations. Its presence says that a store holds the scenario.</summary>
    public const string Region = "demonstration";

    /// <summary>Code of the station that the demonstration's key is for.</summary>
    public const string KeyStation = "alder-mill";

    /// <summary>The key of that station: known to everyone, good from this machine alone.</summary>
    public const string Key = "demonstration-key-for-this-machine-only";

    /// <summary>First date with data.</summary>
    public static readonly DateOnly FirstDate = new(2023, 10, 1);

    /// <summary>Lists that the club's coordinator has drawn up.</summary>
    public static IReadOnlyList<(string Code, string Name, string[] Stations)> Lists { get; } =
    [
        ("old-world", "Europe and Africa", ["alder-mill", "birch-lodge", "larkfield", "larkfield-hill", "cork-oak", "fjord-cabin", "acacia-ridge", "karoo-well"]),
        ("americas", "The Americas", ["cedar-bend", "prairie-barn", "pampa-gate", "mango-court"]),
        ("southern", "South of the equator", ["pampa-gate", "mango-court", "acacia-ridge", "karoo-well", "gumtree-flat", "tussock-hut"]),
    ];
}
