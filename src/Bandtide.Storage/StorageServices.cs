using Bandtide.Storage.Coverage;
using Bandtide.Storage.Days;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Keys;
using Bandtide.Storage.Maintenance;
using Bandtide.Storage.Model;
using Bandtide.Storage.Network;
using Microsoft.EntityFrameworkCore;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.Extensions.DependencyInjection.Extensions;

namespace Bandtide.Storage;

/// <summary>Registers the store.</summary>
public static class StorageServices
{
    /// <summary>
    /// Adds <see cref="NetworkStore"/>, <see cref="DayStore"/>, <see cref="KeyStore"/>, <see cref="HeatmapReader"/>,
    /// <see cref="CoverageReader"/>, <see cref="StoreMaintenance"/> and the context, over one store.
    /// </summary>
    /// <exception cref="InvalidOperationException">No such provider, or PostgreSQL without a connection string.</exception>
    public static IServiceCollection AddBandtideStorage(this IServiceCollection services, StoreOptions options)
    {
        ArgumentNullException.ThrowIfNull(services);
        ArgumentNullException.ThrowIfNull(options);
        services.TryAddSingleton(TimeProvider.System);
        services.AddSingleton(options);
        switch (options.Provider)
        {
            case StoreProvider.Sqlite:
                services.AddSingleton<IStoreDialect>(_ => new SqliteDialect(options.FilePath));
                services.AddDbContextFactory<BandtideContext>(builder =>
                    builder.UseBandtide(StoreProvider.Sqlite, SqliteDialect.ConnectionStringOf(options.FilePath)));
                break;
            case StoreProvider.Postgres:
                services.AddSingleton(_ => PostgresDialect.CreateSource(options.ConnectionString));
                services.AddSingleton<IStoreDialect>(provider => new PostgresDialect(provider.GetRequiredService<Npgsql.NpgsqlDataSource>()));
                services.AddDbContextFactory<BandtideContext>((provider, builder) =>
                    builder.UseBandtide(provider.GetRequiredService<Npgsql.NpgsqlDataSource>()));
                break;
            default:
                throw StoreProvider.Unknown(options.Provider);
        }

        services.AddSingleton(provider => new StoreDatabase(
            provider.GetRequiredService<IStoreDialect>(), provider.GetRequiredService<DbContextOptions<BandtideContext>>()));
        services.AddSingleton(provider => new NetworkStore(Database(provider), Clock(provider)));
        services.AddSingleton(provider => new KeyStore(Database(provider), Clock(provider)));
        services.AddSingleton(provider => new DayStore(Database(provider), provider.GetRequiredService<NetworkStore>(), Clock(provider)));
        services.AddSingleton(provider => new HeatmapReader(Database(provider), provider.GetRequiredService<NetworkStore>(), options));
        services.AddSingleton(provider => new CoverageReader(Database(provider), provider.GetRequiredService<NetworkStore>(), Clock(provider)));
        services.AddSingleton(provider => new StoreMaintenance(Database(provider), provider.GetRequiredService<NetworkStore>(), options));
        return services;
    }

    private static StoreDatabase Database(IServiceProvider provider) => provider.GetRequiredService<StoreDatabase>();

    private static TimeProvider Clock(IServiceProvider provider) => provider.GetRequiredService<TimeProvider>();
}
