using System.Data.Common;
using Bandtide.Storage;
using Bandtide.Storage.Coverage;
using Bandtide.Storage.Days;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Keys;
using Bandtide.Storage.Maintenance;
using Bandtide.Storage.Model;
using Bandtide.Storage.Network;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Npgsql;

namespace Bandtide.Testing.Databases;

/// <summary>A store of one test's own on a real database, with all its services. Gone when disposed.</summary>
public sealed class TestStore : IAsyncDisposable
{
    // A migrated, empty store of each kind, made once per process and copied for each test.
    private static readonly Lazy<Task<string>> SqliteTemplate = new(MakeSqliteTemplateAsync);
    private static readonly Lazy<Task<string>> PostgresTemplate = new(MakePostgresTemplateAsync);

    private readonly ServiceProvider services;
    private readonly bool owner;

    private TestStore(StoreKind kind, StoreOptions options, TimeProvider? clock, bool owner)
    {
        (Kind, Options, this.owner) = (kind, options, owner);
        var collection = new ServiceCollection();
        if (clock is not null)
        {
            collection.AddSingleton(clock);
        }

        services = collection.AddBandtideStorage(options).BuildServiceProvider();
    }

    public StoreKind Kind { get; }

    /// <summary>What a host needs to open the same store.</summary>
    public StoreOptions Options { get; }

    public NetworkStore Network => services.GetRequiredService<NetworkStore>();

    public DayStore Days => services.GetRequiredService<DayStore>();

    public KeyStore Keys => services.GetRequiredService<KeyStore>();

    public HeatmapReader Heatmaps => services.GetRequiredService<HeatmapReader>();

    public CoverageReader Coverage => services.GetRequiredService<CoverageReader>();

    public StoreMaintenance Maintenance => services.GetRequiredService<StoreMaintenance>();

    /// <summary>Makes a store.</summary>
    /// <param name="kind">The database.</param>
    /// <param name="clock">The clock, or <c>null</c> for the system's.</param>
    /// <param name="migrated">Whether it has its tables already; otherwise nothing is there.</param>
    public static async Task<TestStore> StartAsync(StoreKind kind, TimeProvider? clock = null, bool migrated = true)
    {
        if (kind == StoreKind.Sqlite)
        {
            var folder = Directory.CreateTempSubdirectory("bandtide-store-").FullName;
            if (migrated)
            {
                File.Copy(Path.Combine(await SqliteTemplate.Value, StoreOptions.FileName), Path.Combine(folder, StoreOptions.FileName));
            }

            return new(kind, new() { Provider = StoreProvider.Sqlite, DataDirectory = folder }, clock, owner: true);
        }

        var server = await PostgresServer.SharedAsync();
        var connectionString = await server.CreateDatabaseAsync(migrated ? await PostgresTemplate.Value : null);
        return new(kind, new() { Provider = StoreProvider.Postgres, ConnectionString = connectionString }, clock, owner: true);
    }

    /// <summary>A second set of services over the same store, as another process would have. Dispose it before this one.</summary>
    public TestStore OpenAgain(TimeProvider? clock = null) => new(Kind, Options, clock, owner: false);

    /// <summary>Runs SQL on the store behind the services' back: to damage it, or to look.</summary>
    public async Task<object?> SqlAsync(string sql)
    {
        await using var context = await services.GetRequiredService<IDbContextFactory<BandtideContext>>().CreateDbContextAsync();
        var connection = context.Database.GetDbConnection();
        await connection.OpenAsync();
        await using var command = connection.CreateCommand();
        command.CommandText = sql;
        return await command.ExecuteScalarAsync();
    }

    /// <summary>A context on the store, which the caller disposes.</summary>
    public BandtideContext CreateContext() => services.GetRequiredService<IDbContextFactory<BandtideContext>>().CreateDbContext();

    public async ValueTask DisposeAsync()
    {
        await services.DisposeAsync();
        if (!owner)
        {
            return;
        }

        if (Kind == StoreKind.Sqlite)
        {
            Directory.Delete(Options.DataDirectory, recursive: true);
        }
        else
        {
            await (await PostgresServer.SharedAsync()).DropDatabaseAsync(Options.ConnectionString!);
        }
    }

    private static async Task<string> MakeSqliteTemplateAsync()
    {
        var folder = Directory.CreateTempSubdirectory("bandtide-template-").FullName;
        AppDomain.CurrentDomain.ProcessExit += (_, _) => Directory.Delete(folder, recursive: true);
        await using (var store = new TestStore(StoreKind.Sqlite, new() { DataDirectory = folder }, null, owner: false))
        {
            await store.Maintenance.MigrateAsync(CancellationToken.None);
        }

        return folder;
    }

    private static async Task<string> MakePostgresTemplateAsync()
    {
        var connectionString = await (await PostgresServer.SharedAsync()).CreateDatabaseAsync();
        await using (var store = new TestStore(
            StoreKind.Postgres, new() { Provider = StoreProvider.Postgres, ConnectionString = connectionString }, null, owner: false))
        {
            await store.Maintenance.MigrateAsync(CancellationToken.None);
        }

        return new NpgsqlConnectionStringBuilder(connectionString).Database!;
    }
}
