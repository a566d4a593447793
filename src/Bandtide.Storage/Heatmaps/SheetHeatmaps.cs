using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Makes heatmaps from day sheets, a few stations in memory at a time.</summary>
internal sealed class SheetHeatmaps(StoreDatabase database)
{
    // Packed sheets in hand at once: some 8 MB.
    private const int SheetsPerRound = 2048;

    /// <summary>The pooled sheets of a selection, and the state they were read at.</summary>
    public Task<(HeatmapSelection Selection, PooledHeatmap Pooled)> PoolAsync(HeatmapSelection selection, CancellationToken ct) =>
        database.SnapshotAsync(async session =>
        {
            var (from, to) = HeatmapSelection.MonthNumbers(selection.Query.Period);
            var current = selection.At(await ChangeCounters.ReadAsync(session, from, to, ct));
            return (current, await PoolAsync(session, current, ct));
        }, ct);

    private static async Task<PooledHeatmap> PoolAsync(StoreSession session, HeatmapSelection selection, CancellationToken ct)
    {
        var pool = new DayPool(selection.Query, selection.Network.Plan);
        var unpacker = new SheetUnpacker(selection.Query.Measure, selection.Network.Plan.Layer(selection.Query.Layer));
        var reporting = new List<Station>();

        // While one round is unpacked and pooled, the next is read.
        var pooling = Task.CompletedTask;
        try
        {
            foreach (var part in selection.Parts.Where(part => part.Months.Count > 0))
            {
                foreach (var stations in part.Stations.Chunk(Math.Max(1, SheetsPerRound / part.Months.Sum(month => month.Days))))
                {
                    var sheets = await ReadAsync(session, stations, part.Months, ct);
                    await pooling;
                    pooling = Task.Run(() => Add(stations, sheets), ct);
                }
            }
        }
        finally
        {
            await pooling;
        }

        return new(pool.ToHeatmap(), reporting);

        void Add(Station[] stations, ILookup<int, (int Date, byte[] Sheet)> sheets)
        {
            foreach (var station in stations)
            {
                ct.ThrowIfCancellationRequested();
                if (unpacker.Unpack(station, sheets[station.Id]) is { Count: > 0 } days)
                {
                    reporting.Add(station);
                    pool.Add(station, days);
                }
            }
        }
    }

    private static async Task<ILookup<int, (int Date, byte[] Sheet)>> ReadAsync(
        StoreSession session, Station[] stations, IReadOnlyList<YearMonth> months, CancellationToken ct)
    {
        // One run of months is a range; several, as of seasons over years, are a list of dates.
        var isRun = months[^1].Number - months[0].Number == months.Count - 1;
        await using var command = session.Command(
            $"""
            SELECT station_id, date, sheet FROM day_sheet
            WHERE {session.Dialect.InNumbers("station_id", "@stations")} AND sheet IS NOT NULL
            AND {(isRun ? "date BETWEEN @first AND @last" : session.Dialect.InNumbers("date", "@dates"))}
            """);
        command.Parameters.Add(session.Dialect.Numbers("@stations", [.. stations.Select(station => station.Id)]));
        if (isRun)
        {
            command.Add("@first", EpochDay.Of(months[0].FirstDay));
            command.Add("@last", EpochDay.Of(months[^1].LastDay));
        }
        else
        {
            command.Parameters.Add(session.Dialect.Numbers(
                "@dates", [.. months.SelectMany(month => Enumerable.Range(EpochDay.Of(month.FirstDay), month.Days))]));
        }

        var rows = await command.ListAsync(row => (Station: row.GetInt32(0), Day: (row.GetInt32(1), row.GetFieldValue<byte[]>(2))), ct);
        return rows.ToLookup(row => row.Station, row => row.Day);
    }
}
