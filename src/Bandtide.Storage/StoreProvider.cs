using Microsoft.EntityFrameworkCore;
using Npgsql;

namespace Bandtide.Storage;

/// <summary>The choice between the two providers, made in one place.</summary>
public static class StoreProvider
{
    /// <summary>The embedded store: one SQLite file.</summary>
    public const string Sqlite = "sqlite";

    /// <summary>The production store: PostgreSQL.</summary>
    public const string Postgres = "postgres";

    private const string SqliteMigrations = "Bandtide.Migrations.Sqlite";
    private const string PostgresMigrations = "Bandtide.Migrations.Postgres";

    /// <summary>Points a context at a provider and its set of migrations; without a connection string only for design time.</summary>
    /// <exception cref="InvalidOperationException">No such provider; the message says what is allowed.</exception>
    public static void UseBandtide(this DbContextOptionsBuilder builder, string provider, string? connectionString = null)
    {
        ArgumentNullException.ThrowIfNull(builder);
        _ = provider switch
        {
            Sqlite => builder.UseSqlite(connectionString, sqlite => sqlite.MigrationsAssembly(SqliteMigrations)),
            Postgres => builder.UseNpgsql(connectionString, postgres => postgres.MigrationsAssembly(PostgresMigrations)),
            _ => throw Unknown(provider),
        };
    }

    internal static void UseBandtide(this DbContextOptionsBuilder builder, NpgsqlDataSource source) =>
        builder.UseNpgsql(source, postgres => postgres.MigrationsAssembly(PostgresMigrations));

    internal static InvalidOperationException Unknown(string? provider) =>
        new($"Storage:Provider '{provider}' is not known; it is {Sqlite} or {Postgres}.");
}
