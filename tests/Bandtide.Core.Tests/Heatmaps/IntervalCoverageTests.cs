using Bandtide.Testing.Simulation;

namespace Bandtide.Core.Tests.Heatmaps;

/// <summary>
/// The 95 % interval of a mean holds the true mean in about 95 of 100 simulated networks. Each cell of a simulated heatmap is a
/// replicate. Wider simulations: <c>dotnet run -c Release --project tests/Bandtide.Benchmarks -- interval-coverage</c>.
/// </summary>
public sealed class IntervalCoverageTests
{
    // A test that repeats itself with another seed should fail less than once in a thousand times.
    private const double StandardErrors = 3.3;

    [Theory]
    [InlineData(3, 28)]
    [InlineData(5, 29)]
    [InlineData(10, 30)]
    [InlineData(30, 31)]
    public void A_region_around_one_half(int stations, int days) => AssertCoverage(new("region", stations, days), 0.93, 0.97);

    [Theory]
    [InlineData(28)]
    [InlineData(31)]
    public void One_station_with_correlated_days(int days) => AssertCoverage(new("station", 1, days) { RestSd = 0 }, 0.93, 0.97);

    [Theory]
    [InlineData(1)]
    [InlineData(3)]
    [InlineData(10)]
    public void Levels_in_decibels(int stations) => AssertCoverage(new("level", stations, 30) { Scale = CoverageScale.Level }, 0.93, 0.97);

    [Theory]
    [InlineData(3)]
    [InlineData(10)]
    public void Stations_that_miss_half_their_days(int stations) => AssertCoverage(new("gaps", stations, 30) { Missing = 0.5 }, 0.93, 0.97);

    // Near the ends of the scale the distribution of days is skewed, and an interval from a month is a little short.
    [Theory]
    [InlineData(1, -4)]
    [InlineData(5, -4)]
    [InlineData(10, 4)]
    public void Occupancies_near_nought_and_one(int stations, double centre) => AssertCoverage(
        new("edge", stations, 30) { Scale = CoverageScale.LogitOccupancy, Centre = centre, StationSd = 0.5, DaySd = 0.6, RestSd = 0.4 }, 0.92, 0.97);

    [Fact]
    public void Occupancies_at_nought_on_most_days() => AssertCoverage(
        new("nought", 10, 30) { Scale = CoverageScale.LookedAtOccupancy, Centre = -6, StationSd = 0.5, DaySd = 0.6, RestSd = 0.4 }, 0.93, 0.99);

    [Fact]
    public void Days_of_a_Beta_distribution() => AssertCoverage(new("beta", 1, 30) { Scale = CoverageScale.BetaOccupancy }, 0.93, 0.99);

    private static void AssertCoverage(CoverageScenario scenario, double least, double most)
    {
        var result = scenario.Run(seed: 1, replicates: 3_000);
        Assert.True(
            result.Coverage >= least - (StandardErrors * result.StandardError(least)) && result.Coverage <= most + (StandardErrors * result.StandardError(most)),
            $"{result.Held} of {result.Replicates} intervals hold the true mean {result.TrueMean:0.0000}: {result.Coverage:P1}");
    }
}
