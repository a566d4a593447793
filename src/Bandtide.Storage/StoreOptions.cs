namespace Bandtide.Storage;

/// <summary>Where the data is: section <c>Storage</c> of the configuration.</summary>
public sealed class StoreOptions
{
    /// <summary>Name of the embedded store's file in <see cref="DataDirectory"/>.</summary>
    public const string FileName = "bandtide.db";

    /// <summary><c>sqlite</c> (embedded, the default) or <c>postgres</c>.</summary>
    public string Provider { get; init; } = "sqlite";

    /// <summary>Folder of the embedded store. Default <c>./data</c> under the folder where the command was typed.</summary>
    public string DataDirectory { get; init; } = "data";

    /// <summary>Connection string of PostgreSQL, from <c>ConnectionStrings:Bandtide</c>.</summary>
    public string? ConnectionString { get; set; }

    /// <summary>Memory for decoded month tiles, bytes. Default 64 MiB: a thousand stations for several months and measures.</summary>
    public long TileCacheBytes { get; init; } = 64 << 20;

    /// <summary>Memory for finished answers that were read from day sheets, bytes. Default 16 MiB.</summary>
    public long AnswerCacheBytes { get; init; } = 16 << 20;

    /// <summary>Full path of the embedded store's file.</summary>
    public string FilePath => Path.GetFullPath(Path.Combine(DataDirectory, FileName));
}
