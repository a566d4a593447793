using System.Globalization;
using Bandtide.Core.Sheets;

namespace Bandtide.Server.Components.Guide;

/// <summary>A column of a day sheet as the Data page explains it.</summary>
/// <param name="Csv">Name in CSV.</param>
/// <param name="Json">Name in JSON.</param>
/// <param name="Range">What it may hold, with its unit.</param>
/// <param name="IsRequired">Whether every row needs it.</param>
/// <param name="Meaning">What it says.</param>
internal sealed record ContractColumn(string Csv, string Json, string Range, bool IsRequired, string Meaning)
{
    /// <summary>All columns in the order of the contract.</summary>
    public static IReadOnlyList<ContractColumn> All { get; } = [.. Enum.GetValues<SheetField>().Select(Of)];

    private static ContractColumn Of(SheetField field)
    {
        var decibels = $"−{SheetFields.MaxDecibels} to {SheetFields.MaxDecibels}, dB in the station's unit";
        const string share = "0 to 1";
        var (range, meaning) = field switch
        {
            SheetField.Hour => ("0 to 23", "UTC hour: 5 is 05:00 up to 06:00."),
            SheetField.Band => ("a band code", "Band of either layer; the list of bands gives codes and limits."),
            SheetField.Sweeps => (string.Create(CultureInfo.InvariantCulture, $"1 to {SheetFields.MaxSweeps:#,0}"), "Sweeps of the hour that looked at the band."),
            SheetField.Occupancy => (share, "Share of (bin, sweep) pairs above the threshold."),
            SheetField.Signal => (decibels, "Median level of the pairs above the threshold; empty where none was."),
            SheetField.Level => (decibels, "Median of all levels, occupied or not."),
            SheetField.LevelP90 => (decibels, "Level that a tenth of all levels exceed; not below level."),
            SheetField.Floor => (decibels, "Estimated noise floor."),
            SheetField.Steady => (share, "Share of bins that look like a local carrier: occupied in 95 % of sweeps and steady within 1 dB."),
            _ => (share, "Share of the band's width that was observed; left out means all."),
        };
        return new(SheetFields.Csv[(int)field], SheetFields.Json[(int)field], range, SheetFields.IsRequired(field), meaning);
    }
}
