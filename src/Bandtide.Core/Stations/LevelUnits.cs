namespace Bandtide.Core.Stations;

/// <summary>The spelling of units in the data contract.</summary>
public static class LevelUnits
{
    /// <summary>All spellings, in the order in which they are offered.</summary>
    public static IReadOnlyList<string> All { get; } = ["dBm", "dBuV", "dBuV/m", "dBFS"];

    /// <summary>The unit as the contract spells it.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a unit.</exception>
    public static string Text(this LevelUnit unit) => unit switch
    {
        LevelUnit.DbMilliwatt => "dBm",
        LevelUnit.DbMicrovolt => "dBuV",
        LevelUnit.DbMicrovoltPerMetre => "dBuV/m",
        LevelUnit.DbFullScale => "dBFS",
        _ => throw new ArgumentOutOfRangeException(nameof(unit), unit, "Not a unit."),
    };

    /// <summary>Reads the contract's spelling exactly.</summary>
    public static LevelUnit? Parse(string? text) => text switch
    {
        "dBm" => LevelUnit.DbMilliwatt,
        "dBuV" => LevelUnit.DbMicrovolt,
        "dBuV/m" => LevelUnit.DbMicrovoltPerMetre,
        "dBFS" => LevelUnit.DbFullScale,
        _ => null,
    };
}
