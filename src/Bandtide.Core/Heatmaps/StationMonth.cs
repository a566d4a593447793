namespace Bandtide.Core.Heatmaps;

/// <summary>One month of the days of one station.</summary>
/// <param name="size">Number of cells.</param>
internal sealed class StationMonth(int size)
{
    /// <summary>Months since 0000-01.</summary>
    public int Number { get; private set; }

    /// <summary>Place of its first day among the station's.</summary>
    public int FirstDay { get; private set; }

    /// <summary>Number of its days.</summary>
    public int DayCount { get; set; }

    /// <summary>Days with a value, of each cell.</summary>
    public int[] Days { get; } = new int[size];

    /// <summary>Sum of the values, of each cell: at most 31 x 60,000.</summary>
    public int[] Sums { get; } = new int[size];

    /// <summary>Begins another month.</summary>
    public void Reset(int number, int firstDay)
    {
        (Number, FirstDay, DayCount) = (number, firstDay, 0);
        Array.Clear(Days);
        Array.Clear(Sums);
    }
}
