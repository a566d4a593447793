using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Tiles;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Makes heatmaps from month tiles: from memory where all are there, else from one snapshot of the store.</summary>
internal sealed class TileHeatmaps(StoreDatabase database, TileCache cache)
{
    // Tiles in hand at once, whatever the size of the selection.
    private const int TilesPerRound = 4096;

    /// <summary>The pooled tiles of a selection, and the state they were read at.</summary>
    public async Task<(HeatmapSelection Selection, PooledHeatmap Pooled)> PoolAsync(HeatmapSelection selection, CancellationToken ct)
    {
        if (AllInMemory(selection))
        {
            var pooled = await TryPoolAsync(selection, null, ct);
            if (pooled is not null)
            {
                return (selection, pooled);
            }
        }

        return await database.SnapshotAsync(async session =>
        {
            var (from, to) = HeatmapSelection.MonthNumbers(selection.Query.Period);
            var current = selection.At(await ChangeCounters.ReadAsync(session, from, to, ct));
            return (current, (await TryPoolAsync(current, session, ct))!);
        }, ct);
    }

    private bool AllInMemory(HeatmapSelection selection) => selection.Parts.All(part => part.Months.All(month =>
    {
        var known = Known(selection, month);
        return part.Stations.All(station => known.TryGet(station.Id, out _));
    }));

    // Without a session null when a tile has left the memory meanwhile.
    private async Task<PooledHeatmap?> TryPoolAsync(HeatmapSelection selection, StoreSession? session, CancellationToken ct)
    {
        var pool = new TilePool(selection.Query, selection.Network.Plan);
        var layer = selection.Network.Plan.Layer(selection.Query.Layer).Select(band => band.Id).ToHashSet();
        var reporting = new List<Station>();
        foreach (var part in selection.Parts.Where(part => part.Months.Count > 0))
        {
            var known = part.Months.Select(month => (Month: month, Tiles: Known(selection, month))).ToList();
            foreach (var stations in part.Stations.Chunk(Math.Max(1, TilesPerRound / part.Months.Count)))
            {
                if (session is not null)
                {
                    await LoadMissingAsync(session, selection.Query.Measure, stations, known, ct);
                }

                foreach (var station in stations)
                {
                    var tiles = new List<(YearMonth Month, MonthTile Tile)>(known.Count);
                    foreach (var (month, months) in known)
                    {
                        if (!months.TryGet(station.Id, out var tile))
                        {
                            return null;
                        }

                        if (tile is not null && Touches(tile, layer))
                        {
                            tiles.Add((month, tile));
                        }
                    }

                    if (tiles.Count > 0)
                    {
                        reporting.Add(station);
                        pool.Add(station, tiles);
                    }
                }
            }
        }

        return new(pool.ToHeatmap(), reporting);
    }

    private CachedMonth Known(HeatmapSelection selection, YearMonth month) =>
        cache.At(month.Number, selection.Query.Measure, selection.Counters.Months[month.Number]);

    private async Task LoadMissingAsync(
        StoreSession session, Measure measure, Station[] stations, List<(YearMonth Month, CachedMonth Tiles)> known, CancellationToken ct)
    {
        var months = known.Where(month => stations.Any(station => !month.Tiles.TryGet(station.Id, out _)))
            .ToDictionary(month => month.Month.Number, month => month.Tiles);
        var missing = stations.Select(station => station.Id).Where(id => months.Values.Any(month => !month.TryGet(id, out _))).ToList();
        if (missing.Count == 0)
        {
            return;
        }

        await using var command = session.Command(
            $"""
            SELECT station_id, month, tile FROM month_tile
            WHERE {session.Dialect.InNumbers("station_id", "@stations")} AND {session.Dialect.InNumbers("month", "@months")} AND measure = @measure
            """);
        command.Parameters.Add(session.Dialect.Numbers("@stations", missing));
        command.Parameters.Add(session.Dialect.Numbers("@months", months.Keys));
        command.Add("@measure", (int)measure);
        await using (var reader = await command.ExecuteReaderAsync(ct))
        {
            while (await reader.ReadAsync(ct))
            {
                var (station, month) = (reader.GetInt32(0), reader.GetInt32(1));
                cache.Add(month, measure, months[month], station, StoredTiles.Decode(station, month, measure, reader.GetFieldValue<byte[]>(2)));
            }
        }

        foreach (var (month, tiles) in months)
        {
            foreach (var station in missing)
            {
                cache.Add(month, measure, tiles, station, null);
            }
        }
    }

    private static bool Touches(MonthTile tile, HashSet<short> layer)
    {
        foreach (var band in tile.BandIds)
        {
            if (layer.Contains(band))
            {
                return true;
            }
        }

        return false;
    }
}
