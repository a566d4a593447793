namespace Bandtide.Testing;

/// <summary>Measured day sheets: the one whose licence allows a copy, and the others where they stand beside the repository.</summary>
public static class MeasuredData
{
    /// <summary>Path of the copied file, always there.</summary>
    public static string Tokyo { get; } = Path.Combine(AppContext.BaseDirectory, "Measured", "jp-tyo.csv");

    /// <summary>All day sheets in a folder <c>shared/data/daysheets</c> beside the repository; empty where there is none.</summary>
    public static IReadOnlyList<string> Beside { get; } = FindBeside();

    private static string[] FindBeside()
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            var candidate = Path.Combine(folder.FullName, "shared", "data", "daysheets");
            if (Directory.Exists(candidate))
            {
                return [.. Directory.GetFiles(candidate, "*.csv").Order(StringComparer.Ordinal)];
            }
        }

        return [];
    }
}
