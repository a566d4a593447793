namespace Bandtide.Core.Sheets;

/// <summary>How the fields of a cell are spelled, measured and limited: the data contract as a table.</summary>
public static class SheetFields
{
    /// <summary>Number of fields.</summary>
    public const int Count = 10;

    /// <summary>Largest number of sweeps.</summary>
    public const int MaxSweeps = 1_000_000;

    /// <summary>Largest size of a decibel value, dB.</summary>
    public const int MaxDecibels = 300;

    private static readonly string[] CsvNames =
        ["hour", "band", "sweeps", "occupancy", "signal", "level", "level_p90", "floor", "steady", "coverage"];

    private static readonly string[] JsonNames =
        ["hour", "band", "sweeps", "occupancy", "signal", "level", "levelP90", "floor", "steady", "coverage"];

    /// <summary>Column names in the order of <see cref="SheetField"/>.</summary>
    public static IReadOnlyList<string> Csv => CsvNames;

    /// <summary>Property names in the order of <see cref="SheetField"/>.</summary>
    public static IReadOnlyList<string> Json => JsonNames;

    /// <summary>Property names as JSON bodies hold them.</summary>
    internal static byte[][] JsonUtf8 { get; } = [.. JsonNames.Select(System.Text.Encoding.ASCII.GetBytes)];

    /// <summary>Whether every cell needs the field.</summary>
    public static bool IsRequired(SheetField field) => field <= SheetField.Occupancy;

    /// <summary>Decimal places of the stored resolution.</summary>
    public static int Decimals(Quantity quantity) => quantity switch
    {
        Quantity.Sweeps => 0,
        Quantity.Occupancy or Quantity.Steady or Quantity.Coverage => 4,
        _ => 2,
    };

    /// <summary>The quantity of a field, from <see cref="SheetField.Sweeps"/> on.</summary>
    public static Quantity QuantityOf(SheetField field) => (Quantity)(field - SheetField.Sweeps);

    /// <summary>Place of a column's field in <see cref="SheetField"/>, or -1 for a column that the contract does not know.</summary>
    internal static int FieldOfColumn(string name) => Array.IndexOf(CsvNames, name);

    /// <summary>The field of a quantity.</summary>
    public static SheetField FieldOf(Quantity quantity) => (SheetField)quantity + (int)SheetField.Sweeps;
}
