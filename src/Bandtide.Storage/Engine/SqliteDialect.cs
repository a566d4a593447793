using System.Data;
using System.Data.Common;
using System.Globalization;
using Bandtide.Storage.Days;
using Bandtide.Storage.Tiles;
using Microsoft.Data.Sqlite;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Engine;

/// <summary>The embedded store: one file in write-ahead mode, every commit on disk before it is acknowledged.</summary>
/// <remarks>
/// SQLite has one writer at a time. Writers of this process queue in order of arrival, so that none of them ever meets a
/// lock; the busy timeout is for other processes (backup, rebuild). Lists travel as JSON.
/// </remarks>
internal sealed class SqliteDialect(string file) : IStoreDialect, IDisposable
{
    private const int BusyTimeoutMilliseconds = 30_000;

    private readonly string connectionString = ConnectionStringOf(file);

    // First come, first served: a released turn goes to the longest waiting task.
    private readonly SemaphoreSlim writers = new(1, 1);

    /// <summary>The connection string of a store in a file.</summary>
    public static string ConnectionStringOf(string file) =>
        new SqliteConnectionStringBuilder { DataSource = file, ForeignKeys = true, DefaultTimeout = BusyTimeoutMilliseconds / 1000 }.ToString();

    public async ValueTask<DbConnection> OpenAsync(CancellationToken ct)
    {
        var connection = new SqliteConnection(connectionString);
        try
        {
            await connection.OpenAsync(ct);
            using var settings = connection.CreateCommand();
            settings.CommandText = string.Create(
                CultureInfo.InvariantCulture, $"PRAGMA busy_timeout = {BusyTimeoutMilliseconds}; PRAGMA synchronous = FULL;");
            settings.ExecuteNonQuery();
            return connection;
        }
        catch
        {
            await connection.DisposeAsync();
            throw;
        }
    }

    public async ValueTask<IDisposable> EnterWriterAsync(CancellationToken ct)
    {
        await writers.WaitAsync(ct);
        return new Turn(writers);
    }

    public ValueTask<DbTransaction> BeginWriteAsync(DbConnection connection, CancellationToken ct) =>
        new(((SqliteConnection)connection).BeginTransaction(IsolationLevel.Serializable, deferred: false));

    public ValueTask<DbTransaction> BeginSnapshotAsync(DbConnection connection, CancellationToken ct) =>
        new(((SqliteConnection)connection).BeginTransaction(IsolationLevel.Serializable, deferred: true));

    // The writing transaction holds the whole file already; what is left is to see whether the station exists.
    public string LockStation => "SELECT 1 FROM station WHERE id = @station";

    public bool IsPassing(Exception exception) =>
        (exception is DbUpdateException { InnerException: { } cause } ? cause : exception)
            is SqliteException { SqliteErrorCode: SQLitePCL.raw.SQLITE_BUSY or SQLitePCL.raw.SQLITE_LOCKED };

    public string InNumbers(string column, string parameter) => $"{column} IN (SELECT value FROM json_each({parameter}))";

    public string InBytes(string column, string parameter) => $"{column} IN (SELECT unhex(value) FROM json_each({parameter}))";

    public DbParameter Numbers(string name, IReadOnlyCollection<int> values) =>
        new SqliteParameter(name, $"[{string.Join(',', values.Select(value => value.ToString(CultureInfo.InvariantCulture)))}]");

    public DbParameter Bytes(string name, IReadOnlyCollection<byte[]> values) =>
        new SqliteParameter(name, $"[{string.Join(',', values.Select(value => $"\"{Convert.ToHexString(value)}\""))}]");

    public async Task WriteDaysAsync(StoreSession session, int stationId, IReadOnlyList<DayEntry> days, MonthTiles tiles, CancellationToken ct)
    {
        await using (var keep = session.Command(DaySql.KeepSuperseded(this)))
        {
            keep.Add("@station", stationId);
            keep.Parameters.Add(Numbers("@superseded", [.. days.Where(day => day.Revision > 1).Select(day => day.Date)]));
            await keep.ExecuteNonQueryAsync(ct);
        }

        await EachAsync(
            session,
            """
            INSERT INTO day_sheet (station_id, date, received_at, revision, cell_count, hours_mask, band_count, checksum, sheet)
            VALUES (@station, @date, @received, @revision, @cells, @hours, @bands, @checksum, @sheet)
            ON CONFLICT (station_id, date) DO UPDATE SET received_at = excluded.received_at, revision = excluded.revision,
                cell_count = excluded.cell_count, hours_mask = excluded.hours_mask, band_count = excluded.band_count,
                checksum = excluded.checksum, sheet = excluded.sheet
            """,
            ["@station", "@date", "@received", "@revision", "@cells", "@hours", "@bands", "@checksum", "@sheet"],
            days,
            day => [stationId, day.Date, day.ReceivedAt, day.Revision, day.Sheet?.CellCount ?? 0, day.Sheet?.HoursMask ?? 0,
                day.Sheet?.BandCount ?? 0, day.Sheet?.Checksum, day.Sheet?.Bytes],
            ct);
        await WriteTilesAsync(session, stationId, tiles, ct);
    }

    public async Task WriteTilesAsync(StoreSession session, int stationId, MonthTiles tiles, CancellationToken ct)
    {
        await using (var delete = session.Command(DaySql.DeleteOtherTiles(this)))
        {
            delete.Add("@station", stationId);
            delete.Parameters.Add(Numbers("@months", [.. tiles.Months]));
            delete.Parameters.Add(Numbers("@kept", tiles.Keys));
            await delete.ExecuteNonQueryAsync(ct);
        }

        await EachAsync(
            session,
            """
            INSERT INTO month_tile (station_id, month, measure, tile) VALUES (@station, @month, @measure, @tile)
            ON CONFLICT (station_id, month, measure) DO UPDATE SET tile = excluded.tile
            """,
            ["@station", "@month", "@measure", "@tile"],
            tiles.Tiles,
            tile => [stationId, tile.Month, (int)tile.Measure, tile.Bytes],
            ct);
        await RaiseCountersAsync(session, tiles.Months, ct);
    }

    public Task RaiseCountersAsync(StoreSession session, IReadOnlyList<int> months, CancellationToken ct) => EachAsync(
        session,
        """
        INSERT INTO month_change (month, counter) VALUES (@month, 1)
        ON CONFLICT (month) DO UPDATE SET counter = counter + 1
        """,
        ["@month"],
        months,
        month => [month],
        ct);

    /// <summary>Closes the idle connections, whereupon SQLite folds its log into the file.</summary>
    public void Dispose()
    {
        using (var pool = new SqliteConnection(connectionString))
        {
            SqliteConnection.ClearPool(pool);
        }

        writers.Dispose();
    }

    // One prepared statement, run once per row.
    private static async Task EachAsync<T>(
        StoreSession session, string sql, string[] names, IReadOnlyList<T> rows, Func<T, object?[]> values, CancellationToken ct)
    {
        await using var command = session.Command(sql);
        foreach (var name in names)
        {
            command.Parameters.Add(new SqliteParameter { ParameterName = name });
        }

        foreach (var row in rows)
        {
            var fields = values(row);
            for (var i = 0; i < fields.Length; i++)
            {
                command.Parameters[i].Value = fields[i] ?? DBNull.Value;
            }

            await command.ExecuteNonQueryAsync(ct);
        }
    }

    private sealed class Turn(SemaphoreSlim writers) : IDisposable
    {
        public void Dispose() => writers.Release();
    }
}
