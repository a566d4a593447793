using Bandtide.Core.Geography;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Heatmaps;

/// <summary>The days of one station kept for counting: two bytes a value, as the distance from the least value of its row.</summary>
internal sealed class StationRows
{
    /// <summary>Marks a value that is not there.</summary>
    public const ushort Missing = ushort.MaxValue;

    private readonly int size;
    private readonly List<int> bases = [];
    private readonly List<ushort[]> rows = [];
    private readonly int[] days;

    /// <summary>Keeps the days that count.</summary>
    /// <param name="square">Where the station is.</param>
    /// <param name="source">Its days.</param>
    /// <param name="minDays">Cells with fewer days are left out.</param>
    public StationRows(MaidenheadLocator square, StationDays source, int minDays)
    {
        (Square, size) = (square, source.Days.Length);
        days = [.. source.Days.Select(count => count >= minDays ? count : 0)];
        var values = new int[size];
        for (var day = 0; day < source.Count; day++)
        {
            var row = source.Values(day);
            for (var cell = 0; cell < size; cell++)
            {
                values[cell] = days[cell] > 0 ? row[cell] : CellGrid.Missing;
            }

            // Values further apart than two bytes reach take a row of their own.
            while (Keep(values))
            {
            }
        }
    }

    /// <summary>Where the station is.</summary>
    public MaidenheadLocator Square { get; }

    /// <summary>Number of rows.</summary>
    public int Count => rows.Count;

    /// <summary>Days with a value, of each cell; 0 where the cell does not count.</summary>
    public ReadOnlySpan<int> Days => days;

    /// <summary>What has to be added to the distances of a row.</summary>
    public int Base(int row) => bases[row];

    /// <summary>The distances of a row, <see cref="Missing"/> where there is no value.</summary>
    public ReadOnlySpan<ushort> Distances(int row) => rows[row];

    // Moves what two bytes can hold into a row; whether there was anything.
    private bool Keep(Span<int> values)
    {
        var least = int.MaxValue;
        foreach (var value in values)
        {
            least = value != CellGrid.Missing && value < least ? value : least;
        }

        if (least == int.MaxValue)
        {
            return false;
        }

        var row = new ushort[size];
        for (var cell = 0; cell < size; cell++)
        {
            var distance = (long)values[cell] - least;
            var kept = values[cell] != CellGrid.Missing && distance < Missing;
            row[cell] = kept ? (ushort)distance : Missing;
            values[cell] = kept ? CellGrid.Missing : values[cell];
        }

        bases.Add(least);
        rows.Add(row);
        return true;
    }
}
