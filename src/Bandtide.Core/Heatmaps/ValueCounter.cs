namespace Bandtide.Core.Heatmaps;

/// <summary>
/// Counts the values of eight neighbouring cells at a time, each into a table of slots from its least to its largest value.
/// </summary>
internal sealed class ValueCounter
{
    /// <summary>Number of cells counted side by side: sixteen bytes of each row.</summary>
    public const int Lanes = 8;

    private readonly int[] starts = new int[Lanes + 1];
    private readonly int[] least = new int[Lanes];
    private readonly int[] parts = new int[Lanes];
    private readonly double[] weights = new double[Lanes];
    private ValueSlot[] slots = [];
    private int first;

    /// <summary>Begins a block of cells.</summary>
    /// <param name="cell">The first.</param>
    /// <param name="lows">Least value of each cell; the block is as long as this, at most <see cref="Lanes"/>.</param>
    /// <param name="highs">Largest value of each cell, below the least where there is none.</param>
    public void Begin(int cell, ReadOnlySpan<int> lows, ReadOnlySpan<int> highs)
    {
        first = cell;
        Array.Clear(parts);
        for (var lane = 0; lane < Lanes; lane++)
        {
            var range = lane < lows.Length ? Math.Max(0, highs[lane] - lows[lane] + 1L) : 0;
            least[lane] = lane < lows.Length ? lows[lane] : 0;
            starts[lane + 1] = starts[lane] + (int)range;
        }

        if (slots.Length < starts[Lanes])
        {
            slots = new ValueSlot[starts[Lanes]];
        }

        slots.AsSpan(0, starts[Lanes]).Clear();
    }

    /// <summary>Takes over what was counted before.</summary>
    public void Add(int lane, ValueTable before)
    {
        for (var i = 0; i < before.Values.Length; i++)
        {
            slots[starts[lane] + before.Values[i] - least[lane]] = before.Slots[i];
        }
    }

    /// <summary>Counts the days of a station.</summary>
    /// <param name="rows">The days.</param>
    /// <param name="stations">Number of stations that share one vote with it, of each cell; empty where none does.</param>
    public void Add(StationRows rows, ReadOnlySpan<int> stations)
    {
        var lanes = Math.Min(Lanes, rows.Days.Length - first);
        for (var lane = 0; lane < lanes; lane++)
        {
            parts[lane] = rows.Days[first + lane] * (stations.IsEmpty ? 1 : stations[first + lane]);
            weights[lane] = 1.0 / parts[lane];
        }

        for (var row = 0; row < rows.Count; row++)
        {
            var distances = rows.Distances(row).Slice(first, lanes);
            var offset = rows.Base(row);
            for (var lane = 0; lane < distances.Length; lane++)
            {
                if (distances[lane] != StationRows.Missing)
                {
                    slots[starts[lane] + offset + distances[lane] - least[lane]].Add(parts[lane], weights[lane]);
                }
            }
        }
    }

    /// <summary>What was counted in a cell of the block.</summary>
    public ValueTable Table(int lane)
    {
        var counted = slots.AsSpan(starts[lane], starts[lane + 1] - starts[lane]);
        var distinct = 0;
        foreach (ref var slot in counted)
        {
            distinct += slot.Largest > 0 ? 1 : 0;
        }

        var table = new ValueTable(new int[distinct], new ValueSlot[distinct]);
        var next = 0;
        for (var i = 0; i < counted.Length; i++)
        {
            if (counted[i].Largest > 0)
            {
                (table.Values[next], table.Slots[next++]) = (least[lane] + i, counted[i]);
            }
        }

        return table;
    }
}
