using Bandtide.Core.Sheets;

namespace Bandtide.Core.Heatmaps;

/// <summary>All measures: the one place where a measure is added.</summary>
public static class Measures
{
    private static readonly MeasureInfo[] Table =
    [
        new(Measure.Occupancy, "occupancy", "Occupancy", "Share of the band's bins and sweeps above the threshold.", Quantity.Occupancy, 4, false),
        new(Measure.Signal, "signal", "Signal", "Median level of what was heard.", Quantity.Signal, 2, true),
        new(Measure.Excess, "excess", "Signal above floor", "Signal minus noise floor: free of gain, not of local noise or resolution.", Quantity.Signal, 2, false),
        new(Measure.Level, "level", "Median level", "Median of all levels, occupied or not.", Quantity.Level, 2, true),
        new(Measure.LevelP90, "level-p90", "90th percentile of level", "Level that a tenth of all levels exceed.", Quantity.LevelP90, 2, true),
        new(Measure.Floor, "floor", "Noise floor", "Estimated noise floor.", Quantity.Floor, 2, true),
        new(Measure.Steady, "steady", "Steady share", "Share of bins that look like a local carrier.", Quantity.Steady, 4, false),
    ];

    /// <summary>All measures in the order in which they are offered.</summary>
    public static IReadOnlyList<MeasureInfo> All => Table;

    /// <summary>What is particular to a measure.</summary>
    public static MeasureInfo Info(this Measure measure) => Table[(int)measure];

    /// <summary>The measure of a word, or <c>null</c>.</summary>
    public static MeasureInfo? Find(string? code) => Array.Find(Table, info => string.Equals(info.Code, code, StringComparison.Ordinal));

    /// <summary>All values of a measure in a grid, in stored units, <see cref="CellGrid.Missing"/> where there is none.</summary>
    /// <param name="grid">The grid.</param>
    /// <param name="measure">The measure.</param>
    /// <param name="scratch">At least 24 x bands long where the measure is a difference; receives it.</param>
    /// <returns>As long as the grid's planes, or empty where no cell has the measure.</returns>
    public static ReadOnlySpan<int> Values(CellGrid grid, Measure measure, Span<int> scratch)
    {
        ArgumentNullException.ThrowIfNull(grid);
        if (!measure.Info().IsDifference)
        {
            return grid.Plane(measure.Info().Quantity);
        }

        var signal = grid.Plane(Quantity.Signal);
        var floor = grid.Plane(Quantity.Floor);
        if (signal.IsEmpty || floor.IsEmpty)
        {
            return default;
        }

        DayKernel.Subtract(signal, floor, scratch);
        return scratch[..signal.Length];
    }
}
