namespace Bandtide.Storage;

/// <summary>Where the data is: section <c>Storage</c> of the configuration.</summary>
public sealed class StoreOptions
{
    /// <summary><c>sqlite</c> (embedded, the default) or <c>postgres</c>.</summary>
    public string Provider { get; init; } = "sqlite";

    /// <summary>Folder of the embedded store. Default <c>./data</c> under the folder where the command was typed.</summary>
    public string DataDirectory { get; init; } = "data";

    /// <summary>Connection string of PostgreSQL, from <c>ConnectionStrings:Bandtide</c>.</summary>
    public string? ConnectionString { get; set; }
}
