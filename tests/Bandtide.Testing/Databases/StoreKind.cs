namespace Bandtide.Testing.Databases;

/// <summary>The databases that every store test runs on.</summary>
public enum StoreKind
{
    /// <summary>A real SQLite file.</summary>
    Sqlite,

    /// <summary>A real PostgreSQL server.</summary>
    Postgres,
}
