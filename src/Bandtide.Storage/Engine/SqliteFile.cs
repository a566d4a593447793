using Bandtide.Storage.Maintenance;
using Microsoft.Data.Sqlite;

namespace Bandtide.Storage.Engine;

/// <summary>The embedded store as a file: its making and its copying.</summary>
internal static class SqliteFile
{
    // A start that was killed while it migrated leaves this mark behind, and every later start would wait for it.
    private static readonly TimeSpan AbandonedMigration = TimeSpan.FromMinutes(2);

    /// <summary>Makes folder and file in write-ahead mode, and clears the mark of an abandoned migration.</summary>
    public static async Task PrepareAsync(string file, CancellationToken ct)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(file)!);
        await using var connection = new SqliteConnection(SqliteDialect.ConnectionStringOf(file));
        await connection.OpenAsync(ct);
        Run(connection, "PRAGMA journal_mode = WAL");
        await using var found = connection.CreateCommand();
        found.CommandText = "SELECT count(*) FROM sqlite_master WHERE name = '__EFMigrationsLock'";
        if ((long)(await found.ExecuteScalarAsync(ct))! == 1)
        {
            await using var clear = connection.CreateCommand();
            clear.CommandText = "DELETE FROM __EFMigrationsLock WHERE julianday('now') - julianday(substr(Timestamp, 1, 19)) > @days";
            clear.Parameters.AddWithValue("@days", AbandonedMigration.TotalDays);
            await clear.ExecuteNonQueryAsync(ct);
        }
    }

    /// <summary>Copies the store to a new file by way of a neighbour that is renamed once it was found whole.</summary>
    public static async Task<BackupOutcome> BackupAsync(StoreDatabase database, string file, CancellationToken ct)
    {
        if (File.Exists(file))
        {
            return new BackupOutcome.Refused($"{file} exists and is not overwritten.");
        }

        if (Path.GetDirectoryName(file) is { } folder)
        {
            Directory.CreateDirectory(folder);
        }

        var partial = file + ".partial";
        File.Delete(partial);
        try
        {
            var finding = await database.ReadAsync(session => Task.FromResult(CopyAndCheck((SqliteConnection)session.Connection, partial)), ct);
            if (finding is not "ok")
            {
                return new BackupOutcome.Refused($"The copy is not whole: {finding}");
            }

            File.Move(partial, file, overwrite: false);
            return new BackupOutcome.Done(file, new FileInfo(file).Length);
        }
        finally
        {
            File.Delete(partial);
        }
    }

    private static string CopyAndCheck(SqliteConnection source, string partial)
    {
        using var copy = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = partial, Pooling = false }.ToString());
        copy.Open();
        source.BackupDatabase(copy);

        // One file that needs no companions, wherever it is carried.
        Run(copy, "PRAGMA journal_mode = DELETE");
        using var check = copy.CreateCommand();
        check.CommandText = "PRAGMA integrity_check(1)";
        return (string)check.ExecuteScalar()!;
    }

    private static void Run(SqliteConnection connection, string sql)
    {
        using var command = connection.CreateCommand();
        command.CommandText = sql;
        command.ExecuteNonQuery();
    }
}
