using Bandtide.Testing.Simulation;

namespace Bandtide.Benchmarks;

/// <summary>Simulates how often the 95 % interval of a mean holds the true one, in many more replicates than the tests afford.</summary>
internal static class CoverageBenchmark
{
    private const int Replicates = 20_000;

    private static readonly CoverageScenario[] Scenarios =
    [
        .. new[] { 2, 3, 5, 10, 30, 100 }.Select(stations => new CoverageScenario("region around 0.5", stations, 30)),
        .. new[] { 28, 29, 31 }.Select(days => new CoverageScenario("region around 0.5", 10, days)),
        .. new[] { 0, 0.2, 0.4, 0.6, 0.8 }.Select(r => new CoverageScenario($"one station, lag-1 {r:0.0}", 1, 30) { DayCorrelation = r, RestSd = 0 }),
        .. new[] { 2, 3, 5, 10, 20 }.Select(days => new CoverageScenario("one station", 1, days) { RestSd = 0 }),
        .. new[] { 0, 0.2, 0.6, 0.8 }.Select(r => new CoverageScenario($"region, lag-1 {r:0.0}", 10, 30) { DayCorrelation = r }),
        .. new[] { 2, 5, 10 }.Select(days => new CoverageScenario("region, few days", 10, days)),
        .. new[] { 3, 10, 30 }.Select(stations => new CoverageScenario("half the station-days missing", stations, 30) { Missing = 0.5 }),
        new CoverageScenario("one station, half the days missing", 1, 30) { Missing = 0.5, RestSd = 0 },
        .. new[] { 3, 10 }.Select(stations => new CoverageScenario("no common days", stations, 30) { DaySd = 0 }),
        .. new[] { 1, 3, 10, 30 }.Select(stations => new CoverageScenario("level, dB", stations, 30) { Scale = CoverageScale.Level }),
        .. new[] { 1, 3, 5, 10, 30 }.Select(stations => Logit("near 0, logit-normal", stations, -4)),
        .. new[] { 1, 3, 10 }.Select(stations => Logit("near 1, logit-normal", stations, 4)),
        .. new[] { 1, 3, 10, 30 }.Select(stations => Logit("nearer 0, thirty looks an hour", stations, -5) with { Scale = CoverageScale.LookedAtOccupancy }),
        .. new[] { 1, 10 }.Select(stations => Logit("at 0 often, thirty looks an hour", stations, -7) with { Scale = CoverageScale.LookedAtOccupancy }),
        .. new[] { 1, 10 }.Select(stations => new CoverageScenario("near 0, Beta days", stations, 30) { Scale = CoverageScale.BetaOccupancy }),
        .. new[] { 3, 10 }.Select(stations => Logit("near 0, very uneven", stations, -4) with { StationSd = 1, DaySd = 1, RestSd = 0.8 }),
    ];

    /// <summary>Prints a table of coverages.</summary>
    public static Task RunAsync()
    {
        Console.WriteLine("\n| scenario | stations | days | true mean | coverage | below | mean width |\n|---|---|---|---|---|---|---|");
        var results = new CoverageResult[Scenarios.Length];
        Parallel.For(0, Scenarios.Length, i => results[i] = Scenarios[i].Run(seed: 20260601, Replicates));
        for (var i = 0; i < results.Length; i++)
        {
            var (scenario, result) = (Scenarios[i], results[i]);
            Bench.Say($"| {scenario.Name} | {scenario.Stations} | {scenario.Days} | {result.TrueMean:0.0000} | {100 * result.Coverage:0.0} % | {100.0 * result.Below / result.Replicates:0.0} % | {result.MeanWidth:0.0000} |");
        }

        return Task.CompletedTask;
    }

    private static CoverageScenario Logit(string name, int stations, double centre) =>
        new(name, stations, 30) { Scale = CoverageScale.LogitOccupancy, Centre = centre, StationSd = 0.5, DaySd = 0.6, RestSd = 0.4 };
}
