using System.Diagnostics;
using Bandtide.Testing.Databases;

namespace Bandtide.Benchmarks;

/// <summary>From an empty folder to a complete page with the demonstration scenario, and the memory of the idle server.</summary>
internal static class StartBenchmark
{
    public static async Task RunAsync()
    {
        for (var run = 0; run < 3; run++)
        {
            var started = Stopwatch.GetTimestamp();
            await using var server = await BenchServer.StartAsync(StoreKind.Sqlite, null, "--demo");
            using var client = new HttpClient();
            var page = await client.GetStringAsync(server.Address);
            var seconds = Stopwatch.GetElapsedTime(started).TotalSeconds;
            if (!page.Contains("<svg", StringComparison.Ordinal))
            {
                throw new InvalidOperationException("The first page holds no picture.");
            }

            await Task.Delay(TimeSpan.FromSeconds(10));
            Bench.Say($"| demo start, empty folder to a complete page | {seconds:0.0} s | {server.MegabytesResident:0} MB resident ten seconds later |");
        }
    }
}
