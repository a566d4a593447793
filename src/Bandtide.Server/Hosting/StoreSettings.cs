using Bandtide.Storage;
using Npgsql;

namespace Bandtide.Server.Hosting;

/// <summary>Reads where the data is.</summary>
internal static class StoreSettings
{
    private const string Connection = "Bandtide";
    private static readonly string[] Known = [nameof(StoreOptions.Provider), nameof(StoreOptions.DataDirectory)];

    /// <summary>The store of the configuration; a relative data directory is taken from where the command was typed.</summary>
    /// <exception cref="SettingException">A setting is missing or wrong.</exception>
    public static StoreOptions Read(IConfiguration configuration)
    {
        var section = configuration.GetSection("Storage");
        if (section.GetChildren().FirstOrDefault(child => !Known.Contains(child.Key, StringComparer.OrdinalIgnoreCase)) is { } unknown)
        {
            // A misspelt data directory would quietly fill another one.
            throw new SettingException($"Storage:{unknown.Key} is not a setting; there are {string.Join(" and ", Known.Select(name => "Storage:" + name))}.");
        }

        var options = new StoreOptions
        {
            Provider = section["Provider"] is { Length: > 0 } provider ? provider : StoreProvider.Sqlite,
            DataDirectory = Path.GetFullPath(section["DataDirectory"] is { Length: > 0 } directory ? directory : "data"),
            ConnectionString = configuration.GetConnectionString(Connection),
        };
        switch (options.Provider)
        {
            case StoreProvider.Sqlite:
                return options;
            case StoreProvider.Postgres:
                CheckConnection(options.ConnectionString);
                return options;
            default:
                throw new SettingException($"Storage:Provider '{options.Provider}' is not known; it is {StoreProvider.Sqlite} or {StoreProvider.Postgres}.");
        }
    }

    private static void CheckConnection(string? text)
    {
        if (string.IsNullOrWhiteSpace(text))
        {
            throw new SettingException($"ConnectionStrings:{Connection} is empty; Storage:Provider {StoreProvider.Postgres} needs it.");
        }

        try
        {
            _ = new NpgsqlConnectionStringBuilder(text);
        }
        catch (ArgumentException)
        {
            // The text may hold a password, and the library's message may quote it.
            throw new SettingException($"ConnectionStrings:{Connection} is not a PostgreSQL connection string such as Host=db;Database=bandtide;Username=bandtide.");
        }
    }
}
