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
    private const string UpsertDays =
        """
        INSERT INTO day_sheet (station_id, date, received_at, revision, cell_count, hours_mask, band_count, checksum, sheet)
        SELECT @station, * FROM unnest(@dates, @received, @revisions, @cells, @hours, @bands, @checksums, @sheets)
        ON CONFLICT (station_id, date) DO UPDATE SET received_at = excluded.received_at, revision = excluded.revision,
            cell_count = excluded.cell_count, hours_mask = excluded.hours_mask, band_count = excluded.band_count,
            checksum = excluded.checksum, sheet = excluded.sheet
        """;

    private const string UpsertTiles =
        """
        INSERT INTO month_tile (station_id, month, measure, tile)
        SELECT @station, * FROM unnest(@tileMonths, @tileMeasures, @tiles)
        ON CONFLICT (station_id, month, measure) DO UPDATE SET tile = excluded.tile
        """;

    private const string RaiseCounters =
        """
        INSERT INTO month_change (month, counter) SELECT month, 1 FROM unnest(@months) AS month ORDER BY month
        ON CONFLICT (month) DO UPDATE SET counter = month_change.counter + 1
        """;

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

    // Enough to keep other writers of the station out, without stopping foreign keys from pointing at it.
    public string LockStation => "SELECT 1 FROM station WHERE id = @station FOR NO KEY UPDATE";

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

    // One round trip for all of it. The counters come last and in ascending order: writers of different stations meet there
    // alone, and cannot wait for each other in a ring.
    public Task WriteDaysAsync(StoreSession session, int stationId, IReadOnlyList<DayEntry> days, MonthTiles tiles, CancellationToken ct) => RunAsync(
        session,
        $"{DaySql.KeepSuperseded(this)};\n{UpsertDays};\n{DaySql.DeleteOtherTiles(this)};\n{UpsertTiles};\n{RaiseCounters}",
        [
            .. TileParameters(stationId, tiles),
            Array("@superseded", [.. days.Where(day => day.Revision > 1).Select(day => day.Date)]),
            Array("@dates", [.. days.Select(day => day.Date)]),
            Array("@received", [.. days.Select(day => day.ReceivedAt)]),
            Array("@revisions", [.. days.Select(day => day.Revision)]),
            Array("@cells", [.. days.Select(day => day.Sheet?.CellCount ?? 0)]),
            Array("@hours", [.. days.Select(day => day.Sheet?.HoursMask ?? 0)]),
            Array("@bands", [.. days.Select(day => day.Sheet?.BandCount ?? 0)]),
            Array("@checksums", [.. days.Select(day => day.Sheet?.Checksum)]),
            Array("@sheets", [.. days.Select(day => day.Sheet?.Bytes)]),
        ],
        ct);

    public Task WriteTilesAsync(StoreSession session, int stationId, MonthTiles tiles, CancellationToken ct) => RunAsync(
        session, $"{DaySql.DeleteOtherTiles(this)};\n{UpsertTiles};\n{RaiseCounters}", TileParameters(stationId, tiles), ct);

    public Task RaiseCountersAsync(StoreSession session, IReadOnlyList<int> months, CancellationToken ct) =>
        RunAsync(session, RaiseCounters, [Array("@months", months.ToArray())], ct);

    private static NpgsqlParameter[] TileParameters(int stationId, MonthTiles tiles) =>
    [
        new NpgsqlParameter<int>("@station", stationId),
        Array("@months", tiles.Months.ToArray()),
        Array("@kept", tiles.Keys.ToArray()),
        Array("@tileMonths", [.. tiles.Tiles.Select(tile => tile.Month)]),
        Array("@tileMeasures", [.. tiles.Tiles.Select(tile => (int)tile.Measure)]),
        Array("@tiles", [.. tiles.Tiles.Select(tile => tile.Bytes)]),
    ];

    private static NpgsqlParameter<T[]> Array<T>(string name, T[] values) => new(name, values);

    private static async Task RunAsync(StoreSession session, string sql, NpgsqlParameter[] parameters, CancellationToken ct)
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
