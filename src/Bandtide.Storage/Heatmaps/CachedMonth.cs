using System.Collections.Concurrent;
using Bandtide.Core.Tiles;

namespace Bandtide.Storage.Heatmaps;

/// <summary>The tiles of one month and measure that have been read, at one state of the month's counter.</summary>
internal sealed class CachedMonth(long counter)
{
    private readonly ConcurrentDictionary<int, MonthTile?> tiles = new();

    /// <summary>The state.</summary>
    public long Counter => counter;

    /// <summary>Memory taken, bytes. Guarded by the cache.</summary>
    public long Bytes { get; set; }

    /// <summary>When it was last used, in uses of the cache. Guarded by the cache.</summary>
    public long LastUse { get; set; }

    /// <summary>Whether a station's tile, or its absence, is known.</summary>
    public bool TryGet(int stationId, out MonthTile? tile) => tiles.TryGetValue(stationId, out tile);

    /// <summary>Keeps a tile or its absence; false when it was known.</summary>
    public bool TryAdd(int stationId, MonthTile? tile) => tiles.TryAdd(stationId, tile);
}
