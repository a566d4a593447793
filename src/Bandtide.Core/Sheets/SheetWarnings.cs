using System.Globalization;
using Bandtide.Core.Bands;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>Finds suspicious but possible content: stored all the same, told in the receipt.</summary>
public static class SheetWarnings
{
    /// <summary>At most so many warnings in one receipt.</summary>
    public const int Max = 10;

    /// <summary>Margin of the threshold above the floor where the setup tells none, dB.</summary>
    public const double DefaultMarginDb = 5;

    /// <summary>One entry per rule, in a fixed order.</summary>
    /// <param name="sheet">The sheet.</param>
    /// <param name="station">Its station with setups.</param>
    /// <param name="plan">A plan that knows its bands.</param>
    /// <param name="copiedFrom">An earlier date with equal cells, if there is one.</param>
    public static IReadOnlyList<SheetWarning> Find(DaySheet sheet, Station station, BandPlan plan, DateOnly? copiedFrom)
    {
        ArgumentNullException.ThrowIfNull(sheet);
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(plan);
        var warnings = new List<SheetWarning>();
        var setup = station.SetupOn(sheet.Date);
        var cells = sheet.Cells;
        Add(warnings, cells, plan, SheetRule.SignalBelowLevel, "signal below level: what was heard cannot be weaker than the median of everything.", (hour, band) =>
            Both(cells[Quantity.Signal, hour, band], cells[Quantity.Level, hour, band]) && cells[Quantity.Signal, hour, band] < cells[Quantity.Level, hour, band]);
        var margin = (int)Math.Round((setup?.MarginDb ?? DefaultMarginDb) * 100);
        var marginText = string.Create(CultureInfo.InvariantCulture, $"{margin / 100.0:0.##} dB{(setup?.MarginDb is null ? ", no margin being told" : "")}");
        Add(warnings, cells, plan, SheetRule.LevelAboveThreshold, $"level above the threshold (floor + {marginText}) though under half is occupied.", (hour, band) =>
            Both(cells[Quantity.Level, hour, band], cells[Quantity.Floor, hour, band])
            && cells[Quantity.Level, hour, band] > cells[Quantity.Floor, hour, band] + margin && cells[Quantity.Occupancy, hour, band] < 5000);
        if (station.Setups.Count == 0)
        {
            warnings.Add(new(SheetRule.NoSetup, 1, null, null, "The station has told no setup; tell what is connected and how it measures."));
        }
        else if (setup is null)
        {
            warnings.Add(new(SheetRule.BeforeFirstSetup, 1, null, null, $"The date lies before the station's first setup, valid from {DateText.Format(station.Setups[0].ValidFrom)}."));
        }

        if (copiedFrom is { } source)
        {
            warnings.Add(new(SheetRule.CopiedDay, 1, null, null, $"All cells equal those of {DateText.Format(source)}."));
        }

        return warnings;
    }

    private static bool Both(int a, int b) => a != CellGrid.Missing && b != CellGrid.Missing;

    private static void Add(
        List<SheetWarning> warnings, CellGrid cells, BandPlan plan, string rule, string message, Func<int, int, bool> concerns)
    {
        var (count, firstHour, firstBand) = (0, 0, 0);
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            for (var band = 0; band < cells.BandCount; band++)
            {
                if (concerns(hour, band) && count++ == 0)
                {
                    (firstHour, firstBand) = (hour, band);
                }
            }
        }

        if (count > 0)
        {
            warnings.Add(new(rule, count, firstHour, plan.ById(cells.BandIds[firstBand])?.Code, message));
        }
    }
}
