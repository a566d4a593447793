using Bandtide.Core.Bands;

namespace Bandtide.Core.Tests;

public sealed class ArchitectureTests
{
    [Fact]
    public void Core_needs_only_the_base_library() => Assert.All(
        typeof(BandPlan).Assembly.GetReferencedAssemblies(),
        assembly => Assert.StartsWith("System.", assembly.Name, StringComparison.Ordinal));

    // No I/O and no network by name: files, databases, sockets and the web live outside the core.
    [Fact]
    public void Core_reaches_neither_files_nor_network() => Assert.DoesNotContain(
        typeof(BandPlan).Assembly.GetReferencedAssemblies(),
        assembly => assembly.Name is { } name && (name.StartsWith("System.Net", StringComparison.Ordinal)
            || name.StartsWith("System.Data", StringComparison.Ordinal)
            || name.StartsWith("System.IO.FileSystem", StringComparison.Ordinal)
            || name.StartsWith("System.Diagnostics.Process", StringComparison.Ordinal)));
}
