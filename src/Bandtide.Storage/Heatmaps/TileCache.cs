using Bandtide.Core.Heatmaps;
using Bandtide.Core.Tiles;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Unpacked tiles in memory, a month and measure together, the least recently used month leaving first.</summary>
/// <remarks>What is kept was read when the month's counter stood at a known value, and is good exactly while it stands there.</remarks>
internal sealed class TileCache(long capacityBytes)
{
    // Object headers, dictionary entry and band list of a tile, and of a station known to have none, roughly.
    private const int BytesPerEntry = 200;

    private readonly Lock gate = new();
    private readonly Dictionary<(int Month, Measure Measure), CachedMonth> months = [];
    private long bytes;
    private long uses;

    /// <summary>What is known of a month at a state. A reader that is behind gets an empty month of its own, which is not kept.</summary>
    public CachedMonth At(int month, Measure measure, long counter)
    {
        lock (gate)
        {
            if (months.TryGetValue((month, measure), out var known))
            {
                if (known.Counter > counter)
                {
                    return new(counter);
                }

                if (known.Counter == counter)
                {
                    known.LastUse = ++uses;
                    return known;
                }

                bytes -= known.Bytes;
            }

            return months[(month, measure)] = new(counter) { LastUse = ++uses };
        }
    }

    /// <summary>Keeps a station's tile, or that it has none.</summary>
    public void Add(int month, Measure measure, CachedMonth target, int stationId, MonthTile? tile)
    {
        if (!target.TryAdd(stationId, tile))
        {
            return;
        }

        lock (gate)
        {
            if (!months.TryGetValue((month, measure), out var known) || known != target)
            {
                return;
            }

            var size = BytesPerEntry + (tile is null ? 0 : tile.Days.Length * (sizeof(byte) + sizeof(int)));
            target.Bytes += size;
            bytes += size;
            while (bytes > capacityBytes && months.Count > 0)
            {
                var oldest = months.MinBy(entry => entry.Value.LastUse);
                months.Remove(oldest.Key);
                bytes -= oldest.Value.Bytes;
            }
        }
    }
}
