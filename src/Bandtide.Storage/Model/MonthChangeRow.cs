namespace Bandtide.Storage.Model;

/// <summary>How often the data of a month has changed; month 0 counts changes of stations, setups, regions and bands.</summary>
internal sealed class MonthChangeRow
{
    /// <summary>Row of the network's own counter.</summary>
    public const int Network = 0;

    /// <summary>12 x year + month - 1, or <see cref="Network"/>.</summary>
    public int Month { get; set; }

    public long Counter { get; set; }
}
