using Bandtide.Core.Time;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Tiles;

namespace Bandtide.Storage.Days;

/// <summary>Writes days of one station inside a transaction that has locked the station.</summary>
internal sealed class DayWriter(StoreSession session, int stationId)
{
    /// <summary>Locks the station, so that what is read from here on stays true until the transaction ends.</summary>
    public async Task LockAsync(CancellationToken ct)
    {
        if (!await session.Dialect.LockStationAsync(session, stationId, ct))
        {
            throw new InvalidOperationException($"There is no station with the identity {stationId}.");
        }
    }

    /// <summary>What is current for each of the dates that has anything, by date.</summary>
    public async Task<Dictionary<int, DayHead>> HeadsAsync(IReadOnlyCollection<int> dates, CancellationToken ct)
    {
        await using var command = session.Command(
            $"SELECT date, revision, checksum FROM day_sheet WHERE station_id = @station AND {session.Dialect.InNumbers("date", "@dates")}");
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Numbers("@dates", dates));
        var rows = await command.ListAsync(
            row => (Date: row.GetInt32(0), Head: new DayHead(row.GetInt32(1), row.IsDBNull(2) ? null : row.GetFieldValue<byte[]>(2))), ct);
        return rows.ToDictionary(row => row.Date, row => row.Head);
    }

    /// <summary>The earliest date with each of the checksums, dates that are being written left out; by checksum text.</summary>
    public async Task<Dictionary<string, int>> EarliestCopiesAsync(
        IReadOnlyCollection<byte[]> checksums, IReadOnlyCollection<int> written, CancellationToken ct)
    {
        await using var command = session.Command(
            $"""
            SELECT checksum, min(date) FROM day_sheet
            WHERE station_id = @station AND {session.Dialect.InBytes("checksum", "@checksums")} AND NOT ({session.Dialect.InNumbers("date", "@dates")})
            GROUP BY checksum
            """);
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Bytes("@checksums", checksums));
        command.Parameters.Add(session.Dialect.Numbers("@dates", written));
        var rows = await command.ListAsync(row => (Text: PackedSheet.Text(row.GetFieldValue<byte[]>(0)), Date: row.GetInt32(1)), ct);
        return rows.ToDictionary(row => row.Text, row => row.Date, StringComparer.Ordinal);
    }

    /// <summary>Makes each change current, keeps what it supersedes, and brings tiles and counters of the months up to date.</summary>
    public async Task ApplyAsync(IReadOnlyList<DayChange> changes, CancellationToken ct)
    {
        await KeepSupersededAsync([.. changes.Where(change => change.Entry.Revision > 1).Select(change => change.Entry.Date)], ct);
        await session.Dialect.WriteDaysAsync(session, stationId, [.. changes.Select(change => change.Entry)], ct);

        var months = changes.Select(change => YearMonth.Of(EpochDay.ToDate(change.Entry.Date)).Number).Distinct().Order().ToList();
        await new TileWriter(session, stationId).RecomputeAsync(months, changes.ToDictionary(change => change.Entry.Date, change => change.Cells), ct);

        // Last and in ascending order: uploads of different stations meet here alone, and cannot wait for each other in a ring.
        await session.Dialect.RaiseCountersAsync(session, months, ct);
    }

    private async Task KeepSupersededAsync(IReadOnlyCollection<int> dates, CancellationToken ct)
    {
        if (dates.Count == 0)
        {
            return;
        }

        await using var command = session.Command(
            $"""
            INSERT INTO day_revision (station_id, date, revision, received_at, cell_count, hours_mask, band_count, checksum, sheet)
            SELECT station_id, date, revision, received_at, cell_count, hours_mask, band_count, checksum, sheet
            FROM day_sheet WHERE station_id = @station AND {session.Dialect.InNumbers("date", "@dates")}
            """);
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Numbers("@dates", dates));
        await command.ExecuteNonQueryAsync(ct);
    }
}
