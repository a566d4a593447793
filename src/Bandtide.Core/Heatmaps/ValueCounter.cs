namespace Bandtide.Core.Heatmaps;

/// <summary>Counts the values of one cell at a time into a table from its least to its largest value.</summary>
internal sealed class ValueCounter
{
    private Slot[] slots = [];
    private int least;
    private int range;

    /// <summary>Makes room for a cell's values and takes over what was counted before.</summary>
    public void Begin(ValueTable? before, List<StationValues> waiting, int cell)
    {
        var (low, high) = before is null ? (int.MaxValue, int.MinValue) : (before.Values[0], before.Values[^1]);
        foreach (var station in waiting)
        {
            foreach (var value in station.Of(cell))
            {
                low = Math.Min(low, value);
                high = Math.Max(high, value);
            }
        }

        (least, range) = (low, high < low ? 0 : high - low + 1);
        if (slots.Length < range)
        {
            slots = new Slot[range];
        }

        for (var i = 0; before is not null && i < before.Values.Length; i++)
        {
            slots[before.Values[i] - least] = new(before.Weights[i], before.Lightest[i], before.Heaviest[i]);
        }
    }

    /// <summary>Counts values that weigh the same.</summary>
    public void Add(ReadOnlySpan<int> values, double weight)
    {
        foreach (var value in values)
        {
            ref var slot = ref slots[value - least];
            slot = slot.Weight == 0
                ? new(weight, weight, weight)
                : new(slot.Weight + weight, Math.Min(slot.Lightest, weight), Math.Max(slot.Heaviest, weight));
        }
    }

    /// <summary>What was counted, or <c>null</c> for nothing; the counter is empty again.</summary>
    public ValueTable? End()
    {
        var counted = slots.AsSpan(0, range);
        var distinct = 0;
        foreach (ref var slot in counted)
        {
            distinct += slot.Weight > 0 ? 1 : 0;
        }

        if (distinct == 0)
        {
            return null;
        }

        var table = new ValueTable(new int[distinct], new double[distinct], new double[distinct], new double[distinct]);
        var next = 0;
        for (var i = 0; i < counted.Length; i++)
        {
            if (counted[i].Weight > 0)
            {
                table.Values[next] = least + i;
                (table.Weights[next], table.Lightest[next], table.Heaviest[next]) = (counted[i].Weight, counted[i].Lightest, counted[i].Heaviest);
                next++;
            }
        }

        counted.Clear();
        return table;
    }

    private readonly record struct Slot(double Weight, double Lightest, double Heaviest);
}
