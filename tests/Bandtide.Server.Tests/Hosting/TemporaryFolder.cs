namespace Bandtide.Server.Tests.Hosting;

/// <summary>A folder of a test's own, gone when disposed.</summary>
internal sealed class TemporaryFolder : IDisposable
{
    public string Path { get; } = Directory.CreateTempSubdirectory("bandtide-test-").FullName;

    public void Dispose() => Directory.Delete(Path, recursive: true);
}
