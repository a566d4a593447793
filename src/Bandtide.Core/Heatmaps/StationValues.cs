using Bandtide.Core.Geography;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Heatmaps;

/// <summary>The values of one station's days, cell by cell.</summary>
internal sealed class StationValues
{
    private readonly int[] starts;
    private readonly int[] values;

    private StationValues(MaidenheadLocator square, int[] starts, int[] values) => (Square, this.starts, this.values) = (square, starts, values);

    /// <summary>Where the station is.</summary>
    public MaidenheadLocator Square { get; }

    /// <summary>Number of values of all cells.</summary>
    public int Count => values.Length;

    /// <summary>The values of a cell.</summary>
    public ReadOnlySpan<int> Of(int cell) => values.AsSpan(starts[cell], starts[cell + 1] - starts[cell]);

    /// <summary>Turns days of cells into cells of days.</summary>
    /// <param name="square">Where the station is.</param>
    /// <param name="days">Its days.</param>
    /// <param name="minDays">Cells with fewer days come out empty.</param>
    public static StationValues From(MaidenheadLocator square, StationDays days, int minDays)
    {
        var begins = new int[days.Days.Length + 1];
        for (var cell = 0; cell < days.Days.Length; cell++)
        {
            begins[cell + 1] = begins[cell] + (days.Days[cell] >= minDays ? days.Days[cell] : 0);
        }

        var gathered = new int[begins[^1]];
        var next = begins.AsSpan(0, days.Days.Length).ToArray();
        for (var day = 0; day < days.Count; day++)
        {
            var row = days.Values(day);
            for (var cell = 0; cell < row.Length; cell++)
            {
                if (row[cell] != CellGrid.Missing && begins[cell + 1] > begins[cell])
                {
                    gathered[next[cell]++] = row[cell];
                }
            }
        }

        return new(square, begins, gathered);
    }
}
