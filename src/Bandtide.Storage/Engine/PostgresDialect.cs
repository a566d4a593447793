using System.Data;
using System.Data.Common;
using Bandtide.Storage.Days;
using Bandtide.Storage.Tiles;
using Microsoft.EntityFrameworkCore;
using Npgsql;

namespace Bandtide.Storage.Engine;

/// <summary>PostgreSQL: lists are arrays, many rows travel as one statement over arrays, a station's row is the lock of its data.</summary>
internal sealed class PostgresDialect(NpgsqlDataSource source) : IStoreDialect
{
    /// <summary>A data source whose repeated statements are prepared by themselves, unless the connection string says otherwise.</summary>
    public static NpgsqlDataSource CreateSource(string? connectionString)
    {
        if (string.IsNullOrWhiteSpace(connectionString))
        {
            throw new InvalidOperationException("ConnectionStrings:Bandtide is empty; the postgres provider needs it.");
        }

        var builder = new NpgsqlDataSourceBuilder(connectionString);
        if (builder.ConnectionStringBuilder.MaxAutoPrepare == 0)
        {
            builder.ConnectionStringBuilder.MaxAutoPrepare = 64;
            builder.ConnectionStringBuilder.AutoPrepareMinUsages = 2;
        }

        return builder.Build();
    }

    public async ValueTask<DbConnection> OpenAsync(CancellationToken ct) => await source.OpenConnectionAsync(ct);

    // The database lets stations be written side by side.
    public ValueTask<IDisposable> EnterWriterAsync(CancellationToken ct) => new(NoTurn.Instance);

    public ValueTask<DbTransaction> BeginWriteAsync(DbConnection connection, CancellationToken ct) =>
        connection.BeginTransactionAsync(IsolationLevel.ReadCommitted, ct);

    public ValueTask<DbTransaction> BeginSnapshotAsync(DbConnection connection, CancellationToken ct) =>
        connection.BeginTransactionAsync(IsolationLevel.RepeatableRead, ct);

    public bool IsPassing(Exception exception) => exception switch
    {
        DbUpdateException { InnerException: { } cause } => IsPassing(cause),

        // A unique value taken by another transaction in between is met again, and judged, by the next attempt.
        PostgresException failure => failure.SqlState is PostgresErrorCodes.SerializationFailure or PostgresErrorCodes.DeadlockDetected
            or PostgresErrorCodes.UniqueViolation or PostgresErrorCodes.AdminShutdown or PostgresErrorCodes.CannotConnectNow,
        NpgsqlException failure => failure.IsTransient,
        _ => false,
    };

    public string InNumbers(string column, string parameter) => $"{column} = ANY ({parameter})";

    public string InBytes(string column, string parameter) => $"{column} = ANY ({parameter})";

    public DbParameter Numbers(string name, IReadOnlyCollection<int> values) => Array(name, values.ToArray());

    public DbParameter Bytes(string name, IReadOnlyCollection<byte[]> values) => Array(name, values.ToArray());

    public async Task<bool> LockStationAsync(StoreSession session, int stationId, CancellationToken ct)
    {
        // Enough to keep other writers of the station out, without stopping foreign keys from pointing at it.
        await using var command = session.Command("SELECT 1 FROM station WHERE id = @station FOR NO KEY UPDATE");
        command.Parameters.Add(new NpgsqlParameter<int>("@station", stationId));
        return await command.ExecuteScalarAsync(ct) is not null;
    }

    public Task WriteDaysAsync(StoreSession session, int stationId, IReadOnlyList<DayEntry> days, CancellationToken ct) => RunAsync(
        session,
        """
        INSERT INTO day_sheet (station_id, date, received_at, revision, cell_count, hours_mask, band_count, checksum, sheet)
        SELECT @station, * FROM unnest(@dates, @received, @revisions, @cells, @hours, @bands, @checksums, @sheets)
        ON CONFLICT (station_id, date) DO UPDATE SET received_at = excluded.received_at, revision = excluded.revision,
            cell_count = excluded.cell_count, hours_mask = excluded.hours_mask, band_count = excluded.band_count,
            checksum = excluded.checksum, sheet = excluded.sheet
        """,
        ct,
        new NpgsqlParameter<int>("@station", stationId),
        Array("@dates", [.. days.Select(day => day.Date)]),
        Array("@received", [.. days.Select(day => day.ReceivedAt)]),
        Array("@revisions", [.. days.Select(day => day.Revision)]),
        Array("@cells", [.. days.Select(day => day.Sheet?.CellCount ?? 0)]),
        Array("@hours", [.. days.Select(day => day.Sheet?.HoursMask ?? 0)]),
        Array("@bands", [.. days.Select(day => day.Sheet?.BandCount ?? 0)]),
        Array("@checksums", [.. days.Select(day => day.Sheet?.Checksum)]),
        Array("@sheets", [.. days.Select(day => day.Sheet?.Bytes)]));

    public Task WriteTilesAsync(StoreSession session, int stationId, IReadOnlyList<PackedTile> tiles, CancellationToken ct) => RunAsync(
        session,
        """
        INSERT INTO month_tile (station_id, month, measure, tile)
        SELECT @station, * FROM unnest(@months, @measures, @tiles)
        ON CONFLICT (station_id, month, measure) DO UPDATE SET tile = excluded.tile
        """,
        ct,
        new NpgsqlParameter<int>("@station", stationId),
        Array("@months", [.. tiles.Select(tile => tile.Month)]),
        Array("@measures", [.. tiles.Select(tile => (int)tile.Measure)]),
        Array("@tiles", [.. tiles.Select(tile => tile.Bytes)]));

    public Task RaiseCountersAsync(StoreSession session, IReadOnlyList<int> months, CancellationToken ct) => RunAsync(
        session,
        """
        INSERT INTO month_change (month, counter) SELECT month, 1 FROM unnest(@months) AS month ORDER BY month
        ON CONFLICT (month) DO UPDATE SET counter = month_change.counter + 1
        """,
        ct,
        Array("@months", months.ToArray()));

    private static NpgsqlParameter<T[]> Array<T>(string name, T[] values) => new(name, values);

    private static async Task RunAsync(StoreSession session, string sql, CancellationToken ct, params NpgsqlParameter[] parameters)
    {
        await using var command = session.Command(sql);
        command.Parameters.AddRange(parameters);
        await command.ExecuteNonQueryAsync(ct);
    }

    private sealed class NoTurn : IDisposable
    {
        public static readonly NoTurn Instance = new();

        public void Dispose()
        {
        }
    }
}
