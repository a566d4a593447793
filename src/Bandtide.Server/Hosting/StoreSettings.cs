using Bandtide.Storage;

namespace Bandtide.Server.Hosting;

/// <summary>Reads where the data is.</summary>
internal static class StoreSettings
{
    /// <summary>The store of the configuration; a relative data directory is taken from where the command was typed.</summary>
    public static StoreOptions Read(IConfiguration configuration)
    {
        var section = configuration.GetSection("Storage");
        return new()
        {
            Provider = section["Provider"] ?? "sqlite",
            DataDirectory = Path.GetFullPath(section["DataDirectory"] ?? "data"),
            ConnectionString = configuration.GetConnectionString("Bandtide"),
        };
    }
}
