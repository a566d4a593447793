namespace Bandtide.Testing;

/// <summary>The repository the tests were built from.</summary>
public static class Repository
{
    /// <summary>Full path of its root.</summary>
    public static string Root { get; } = Find();

    private static string Find()
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "Bandtide.slnx")))
            {
                return folder.FullName;
            }
        }

        throw new InvalidOperationException("The tests have to run below the repository.");
    }
}
