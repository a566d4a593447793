using System.Data.Common;
using Bandtide.Core.Time;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Tiles;

namespace Bandtide.Storage.Days;

/// <summary>Writes days of one station inside a transaction. Few round trips: each costs as much as storing a day.</summary>
internal sealed class DayWriter(StoreSession session, int stationId)
{
    /// <summary>Locks the station, so that what is read from here on stays true until the transaction ends, and reads what is current.</summary>
    /// <param name="dates">Dates to be written.</param>
    /// <param name="checksums">Checksums to look for at other dates.</param>
    /// <param name="ct">Cancels.</param>
    public async Task<DayState> LockAsync(IReadOnlyCollection<int> dates, IReadOnlyCollection<byte[]> checksums, CancellationToken ct)
    {
        // Each statement sees what was committed before it began: the second and third all that the lock waited for.
        await using var command = session.Command(
            $"""
            {session.Dialect.LockStation};
            SELECT date, revision, checksum FROM day_sheet WHERE station_id = @station AND {session.Dialect.InNumbers("date", "@dates")};
            SELECT checksum, min(date) FROM day_sheet
            WHERE station_id = @station AND {session.Dialect.InBytes("checksum", "@checksums")} AND NOT ({session.Dialect.InNumbers("date", "@dates")})
            GROUP BY checksum
            """);
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Numbers("@dates", dates));
        command.Parameters.Add(session.Dialect.Bytes("@checksums", checksums));
        await using var reader = await command.ExecuteReaderAsync(ct);
        if (!await reader.ReadAsync(ct))
        {
            throw new InvalidOperationException($"There is no station with the identity {stationId}.");
        }

        var heads = await NextAsync(reader, row => (row.GetInt32(0), new DayHead(row.GetInt32(1), row.IsDBNull(2) ? null : row.GetFieldValue<byte[]>(2))), ct);
        var copies = await NextAsync(reader, row => (PackedSheet.Text(row.GetFieldValue<byte[]>(0)), row.GetInt32(1)), ct);
        return new(heads.ToDictionary(), copies.ToDictionary(StringComparer.Ordinal));
    }

    /// <summary>Makes each change current, keeps what it supersedes, and brings tiles and counters of the months up to date.</summary>
    public async Task ApplyAsync(IReadOnlyList<DayChange> changes, CancellationToken ct)
    {
        int[] months = [.. changes.Select(change => YearMonth.Of(EpochDay.ToDate(change.Entry.Date)).Number).Distinct().Order()];
        var tiles = await TileMaker.MakeAsync(session, stationId, months, changes.ToDictionary(change => change.Entry.Date, change => change.Cells), ct);
        await session.Dialect.WriteDaysAsync(session, stationId, [.. changes.Select(change => change.Entry)], tiles, ct);
    }

    private static async Task<List<(TKey, TValue)>> NextAsync<TKey, TValue>(
        DbDataReader reader, Func<DbDataReader, (TKey, TValue)> item, CancellationToken ct)
    {
        var items = new List<(TKey, TValue)>();
        await reader.NextResultAsync(ct);
        while (await reader.ReadAsync(ct))
        {
            items.Add(item(reader));
        }

        return items;
    }
}
