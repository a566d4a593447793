using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Tests.Heatmaps;

public sealed class LevelComparabilityTests
{
    private static readonly DateOnly First = new(2026, 6, 1);
    private static readonly DateOnly Last = new(2026, 6, 30);

    public static TheoryData<Measure> Levels => [Measure.Signal, Measure.Level, Measure.LevelP90, Measure.Floor];

    [Theory, MemberData(nameof(Levels))]
    public void Levels_of_different_units_are_refused(Measure measure)
    {
        var refusal = Judge(measure, Station(LevelUnit.DbMilliwatt), Station(LevelUnit.DbMicrovolt)).Refusal;
        Assert.Contains("dBm", refusal, StringComparison.Ordinal);
        Assert.Contains("dBuV", refusal, StringComparison.Ordinal);
        Assert.Null(Judge(measure, Station(LevelUnit.DbMicrovolt), Station(LevelUnit.DbMicrovolt)).Refusal);
    }

    [Theory]
    [InlineData(Measure.Occupancy)]
    [InlineData(Measure.Excess)]
    [InlineData(Measure.Steady)]
    public void What_is_free_of_gain_is_pooled_over_units(Measure measure) =>
        Assert.Equal(new(null, null), Judge(measure, Station(LevelUnit.DbMilliwatt), Station(LevelUnit.DbFullScale)));

    [Theory, MemberData(nameof(Levels))]
    public void Uncalibrated_levels_of_several_stations_are_cautioned(Measure measure)
    {
        Assert.Contains("dBFS", Judge(measure, Station(LevelUnit.DbFullScale), Station(LevelUnit.DbFullScale)).Caution, StringComparison.Ordinal);
        Assert.Null(Judge(measure, Station(LevelUnit.DbFullScale)).Caution);
    }

    // The limits of the data contract: detector, resolution by more than a factor of 2, margin by more than 3 dB.
    [Theory]
    [InlineData(100, 5, 200, 8, null)]
    [InlineData(100, 5, 201, 8, "resolution")]
    [InlineData(100, 5, 200, 8.1, "margin")]
    public void Setups_further_apart_than_the_limits_are_cautioned(double resolutionA, double marginA, double resolutionB, double marginB, string? reason)
    {
        var a = Station(LevelUnit.DbMilliwatt, new Setup(First, ResolutionHz: resolutionA, MarginDb: marginA));
        var b = Station(LevelUnit.DbMilliwatt, new Setup(First, ResolutionHz: resolutionB, MarginDb: marginB));
        foreach (var judgement in new[] { Judge(Measure.Level, a, b), Judge(Measure.Level, b, a) })
        {
            Assert.Null(judgement.Refusal);
            Assert.Equal(reason is null, judgement.Caution is null);
            Assert.Contains(reason ?? "", judgement.Caution ?? "", StringComparison.Ordinal);
        }
    }

    [Fact]
    public void Detectors_that_differ_are_cautioned_and_what_is_not_told_is_not_held_against_anyone()
    {
        var power = Station(LevelUnit.DbMilliwatt, new Setup(First, Detector: Detector.Power));
        var peak = Station(LevelUnit.DbMilliwatt, new Setup(First, Detector: Detector.Peak));
        var silent = Station(LevelUnit.DbMilliwatt, new Setup(First));
        Assert.Contains("detector", Judge(Measure.Level, power, peak).Caution, StringComparison.Ordinal);
        Assert.Null(Judge(Measure.Level, power, silent, Station(LevelUnit.DbMilliwatt)).Caution);
    }

    [Fact]
    public void Only_setups_in_effect_count()
    {
        var now = Station(LevelUnit.DbMilliwatt, new Setup(First.AddDays(-100), MarginDb: 20), new Setup(First, MarginDb: 5), new Setup(Last.AddDays(1), MarginDb: 30));
        var other = Station(LevelUnit.DbMilliwatt, new Setup(First.AddDays(-1), MarginDb: 5));
        Assert.Null(Judge(Measure.Level, now, other).Caution);
        Assert.NotNull(LevelComparability.Judge(Measure.Level, [now, other], First.AddDays(-1), Last).Caution);
        Assert.NotNull(LevelComparability.Judge(Measure.Level, [now, other], First, Last.AddDays(1)).Caution);
    }

    private static Comparability Judge(Measure measure, params Station[] stations) => LevelComparability.Judge(measure, stations, First, Last);

    private static Station Station(LevelUnit unit, params Setup[] setups) => new(1, "ab", "A", new(50, 10), unit, 1, setups);
}
