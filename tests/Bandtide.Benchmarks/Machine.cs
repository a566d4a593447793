using System.Diagnostics;

namespace Bandtide.Benchmarks;

/// <summary>Says what the figures were measured on.</summary>
internal static class Machine
{
    public static void Describe()
    {
        var model = File.Exists("/proc/cpuinfo")
            ? File.ReadLines("/proc/cpuinfo").FirstOrDefault(line => line.StartsWith("model name", StringComparison.Ordinal))?.Split(':')[1].Trim()
            : null;
        Bench.Say($"{model ?? "unknown processor"}, {Environment.ProcessorCount} cores, .NET {Environment.Version}, commit {Commit()}, {(IsDebug ? "DEBUG BUILD: figures mean nothing" : "release build")}");
    }

    private static bool IsDebug =>
#if DEBUG
        true;
#else
        false;
#endif

    private static string Commit()
    {
        using var git = Process.Start(new ProcessStartInfo("git", ["rev-parse", "--short", "HEAD"]) { RedirectStandardOutput = true, UseShellExecute = false, WorkingDirectory = AppContext.BaseDirectory });
        return git?.StandardOutput.ReadToEnd().Trim() ?? "unknown";
    }
}
