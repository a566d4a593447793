using System.Data.Common;
using Bandtide.Core.Sheets;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Days;

/// <summary>Reads days of one station.</summary>
internal sealed class DayQueries(StoreSession session, int stationId)
{
    private const string Entry = "date, revision, checksum, cell_count, received_at";

    public async Task<StoredDay?> FindAsync(DateOnly date, int? revision, CancellationToken ct)
    {
        // A revision is in one of the two tables; in between it may have moved from the first to the second, never back.
        return await FindInAsync("day_sheet", date, revision, ct)
            ?? (revision is null ? null : await FindInAsync("day_revision", date, revision, ct));
    }

    public async Task<IReadOnlyList<StoredDay>> ListAsync(DateOnly? from, DateOnly? to, CancellationToken ct)
    {
        await using var command = session.Command(
            $"""
            SELECT {Entry} FROM day_sheet
            WHERE station_id = @station AND date BETWEEN @from AND @to AND cell_count > 0 ORDER BY date
            """);
        command.Add("@station", stationId);
        command.Add("@from", EpochDay.Of(from ?? DateOnly.MinValue));
        command.Add("@to", EpochDay.Of(to ?? DateOnly.MaxValue));
        return await command.ListAsync(row => Day(row, null), ct);
    }

    public async Task<IReadOnlyList<StoredDay>> RevisionsAsync(DateOnly date, CancellationToken ct)
    {
        await using var command = session.Command(
            $"""
            SELECT {Entry} FROM day_revision WHERE station_id = @station AND date = @date
            UNION ALL SELECT {Entry} FROM day_sheet WHERE station_id = @station AND date = @date
            ORDER BY revision
            """);
        command.Add("@station", stationId);
        command.Add("@date", EpochDay.Of(date));
        return await command.ListAsync(row => Day(row, null), ct);
    }

    private async Task<StoredDay?> FindInAsync(string table, DateOnly date, int? revision, CancellationToken ct)
    {
        await using var command = session.Command(
            $"SELECT {Entry}, sheet FROM {table} WHERE station_id = @station AND date = @date{(revision is null ? "" : " AND revision = @revision")}");
        command.Add("@station", stationId);
        command.Add("@date", EpochDay.Of(date));
        if (revision is { } number)
        {
            command.Add("@revision", number);
        }

        var found = await command.ListAsync(
            row => Day(row, row.IsDBNull(5) ? null : StoredSheets.Decode(stationId, row.GetInt32(0), row.GetFieldValue<byte[]>(5))), ct);
        return found.SingleOrDefault();
    }

    private static StoredDay Day(DbDataReader row, CellGrid? cells)
    {
        var checksum = row.IsDBNull(2) ? null : row.GetFieldValue<byte[]>(2);
        return new(
            EpochDay.ToDate(row.GetInt32(0)), row.GetInt32(1), PackedSheet.Text(checksum), row.GetInt32(3),
            DateTimeOffset.FromUnixTimeMilliseconds(row.GetInt64(4)), cells, checksum is null);
    }
}
