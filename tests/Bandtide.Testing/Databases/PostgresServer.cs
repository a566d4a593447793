using System.Diagnostics;
using System.Globalization;
using System.Net;
using System.Net.Sockets;
using Npgsql;

namespace Bandtide.Testing.Databases;

/// <summary>
/// A PostgreSQL cluster of this process's own, in a temporary folder, on a free port of the loopback; or, where the
/// environment variable <c>BANDTIDE_TEST_POSTGRES</c> holds a connection string, the server it names.
/// </summary>
/// <remarks>
/// The server hangs on a pipe from this process: when the process ends, in whatever way, the pipe closes, the server stops
/// and its folder goes.
/// </remarks>
public sealed class PostgresServer : IAsyncDisposable
{
    private const string Variable = "BANDTIDE_TEST_POSTGRES";
    private const string ServerUser = "postgres";

    private static readonly Lazy<Task<PostgresServer>> SharedServer = new(() => StartAsync(durable: false));

    private readonly Process? own;
    private readonly string administration;

    private PostgresServer(Process? own, string administration) => (this.own, this.administration) = (own, administration);

    /// <summary>The server that all tests of this process share.</summary>
    public static Task<PostgresServer> SharedAsync() => SharedServer.Value;

    /// <summary>Starts a server.</summary>
    /// <param name="durable">Whether commits reach the disk: benchmarks want it, tests do not.</param>
    public static async Task<PostgresServer> StartAsync(bool durable)
    {
        if (Environment.GetEnvironmentVariable(Variable) is { Length: > 0 } given)
        {
            return new(null, given);
        }

        for (var attempt = 1; ; attempt++)
        {
            try
            {
                return await StartOwnAsync(durable);
            }
            catch (InvalidOperationException) when (attempt < 3)
            {
                // Someone else took the port between its choice and its use.
            }
        }
    }

    /// <summary>Makes a database, empty or as a copy of another of this server, and returns its connection string.</summary>
    public async Task<string> CreateDatabaseAsync(string? template = null)
    {
        var name = $"bandtide_{Guid.NewGuid():N}";
        await AdministerAsync($"CREATE DATABASE {name}{(template is null ? "" : $" TEMPLATE {template}")}");
        return new NpgsqlConnectionStringBuilder(administration) { Database = name }.ToString();
    }

    /// <summary>Drops a database, whoever is still connected to it.</summary>
    public Task DropDatabaseAsync(string connectionString) =>
        AdministerAsync($"DROP DATABASE IF EXISTS {new NpgsqlConnectionStringBuilder(connectionString).Database} WITH (FORCE)");

    public async ValueTask DisposeAsync()
    {
        if (own is not null)
        {
            own.StandardInput.Close();
            await own.WaitForExitAsync();
            own.Dispose();
        }
    }

    private static async Task<PostgresServer> StartOwnAsync(bool durable)
    {
        var folder = Directory.CreateTempSubdirectory("bandtide-postgres-").FullName;
        if (Environment.IsPrivilegedProcess)
        {
            await RunAsync("chown", ServerUser, folder);
        }

        var binaries = FindBinaries();
        await RunAsync(AsServerUser(
            Path.Combine(binaries, "initdb"), "-D", $"{folder}/data", "-U", "bandtide", "-A", "trust", "--no-sync", "-E", "UTF8", "--locale=C"));
        var port = FreePort();
        var process = StartServer(binaries, folder, port, durable);
        var connectionString = new NpgsqlConnectionStringBuilder
        {
            Host = "127.0.0.1",
            Port = port,
            Username = "bandtide",
            Database = "postgres",
            Pooling = false,
            Timeout = 5,
        };
        var server = new PostgresServer(process, connectionString.ToString());
        await server.WaitUntilReadyAsync(process);
        connectionString.Pooling = true;
        return new(process, connectionString.ToString());
    }

    private static Process StartServer(string binaries, string folder, int port, bool durable)
    {
        var options = string.Create(
            CultureInfo.InvariantCulture,
            $"-p {port} -c listen_addresses=127.0.0.1 -c unix_socket_directories='' -c max_connections=200 -c shared_buffers=128MB -c max_wal_size=2GB{(durable ? "" : " -c fsync=off -c full_page_writes=off")}");
        var script = $"'{binaries}/postgres' -D '{folder}/data' {options} >'{folder}/log' 2>&1 & server=$!; cat >/dev/null; kill -QUIT $server; wait $server; rm -rf '{folder}'";
        return Start(AsServerUser("sh", "-c", script), redirectInput: true);
    }

    private async Task WaitUntilReadyAsync(Process started)
    {
        var patience = Stopwatch.StartNew();
        while (true)
        {
            try
            {
                await using var connection = new NpgsqlConnection(administration);
                await connection.OpenAsync();
                return;
            }
            catch (NpgsqlException) when (patience.Elapsed < TimeSpan.FromSeconds(30))
            {
                await Task.Delay(50);
            }
            catch (NpgsqlException exception)
            {
                started.StandardInput.Close();
                throw new InvalidOperationException("The test PostgreSQL server does not answer.", exception);
            }
        }
    }

    private async Task AdministerAsync(string sql)
    {
        await using var connection = new NpgsqlConnection(administration);
        await connection.OpenAsync();
        await using var command = connection.CreateCommand();
        command.CommandText = sql;
        await command.ExecuteNonQueryAsync();
    }

    private static string FindBinaries()
    {
        var folders = (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator, StringSplitOptions.RemoveEmptyEntries)
            .Concat(Directory.Exists("/usr/lib/postgresql")
                ? Directory.GetDirectories("/usr/lib/postgresql").OrderDescending(StringComparer.Ordinal).Select(version => Path.Combine(version, "bin"))
                : []);
        return folders.FirstOrDefault(folder => File.Exists(Path.Combine(folder, "initdb")) && File.Exists(Path.Combine(folder, "postgres")))
            ?? throw new FileNotFoundException($"PostgreSQL is not installed (no initdb and postgres in PATH or /usr/lib/postgresql), and {Variable} is not set.");
    }

    // The server refuses to run as root.
    private static string[] AsServerUser(params string[] command) =>
        Environment.IsPrivilegedProcess ? ["runuser", "-u", ServerUser, "--", .. command] : command;

    private static int FreePort()
    {
        using var listener = new TcpListener(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }

    private static async Task RunAsync(params string[] command)
    {
        using var process = Start(command, redirectInput: false);
        var output = await process.StandardOutput.ReadToEndAsync() + await process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync();
        if (process.ExitCode != 0)
        {
            throw new InvalidOperationException($"{string.Join(' ', command)} failed: {output}");
        }
    }

    private static Process Start(string[] command, bool redirectInput) => Process.Start(new ProcessStartInfo(command[0], command[1..])
    {
        RedirectStandardInput = redirectInput,
        RedirectStandardOutput = !redirectInput,
        RedirectStandardError = !redirectInput,
        WorkingDirectory = Path.GetTempPath(),
    }) ?? throw new InvalidOperationException($"{command[0]} did not start.");
}
