namespace Bandtide.Testing.Databases;

/// <summary>Theory data: the same test on each database.</summary>
public static class Stores
{
    /// <summary>One row per <see cref="StoreKind"/>.</summary>
    public static IEnumerable<object[]> Each { get; } = [.. Enum.GetValues<StoreKind>().Select(kind => new object[] { kind })];
}
