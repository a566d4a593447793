using Bandtide.Core.Statistics;
using CsCheck;

namespace Bandtide.Core.Tests.Statistics;

public sealed class DaySeriesTests
{
    // Two days (of which the correlation is assumed, 0.4): deviations +1 and -1. The variance of their mean is s2 q with
    // q = (1 + 0.4)/2 and s2 = 1/(1 - q), on one degree of freedom.
    [Fact]
    public void Two_days_by_hand()
    {
        var result = Of([10, 11], [1, 1], [1, -1]);
        Assert.Equal(0.7 / 0.3, result.Variance, 1e-9);
        Assert.Equal(1, result.DegreesOfFreedom, 1e-9);
    }

    // Two days further apart: 0.4^3 instead of 0.4.
    [Fact]
    public void Gaps_lessen_the_correlation() =>
        Assert.Equal(0.532 / 0.468, Of([10, 13], [1, 1], [1, -1]).Variance, 1e-9);

    [Fact]
    public void One_day_of_each_month_tells_nothing()
    {
        Assert.True(double.IsNaN(Of([10], [1], [0]).Variance));
        Assert.True(double.IsNaN(Of([10, 50], [1, 2], [0, 0]).Variance));
        Assert.True(double.IsNaN(Of([], [], []).Variance));
    }

    [Fact]
    public void The_variance_goes_with_the_square_of_the_values_and_not_with_the_scale_of_the_weights() =>
        Gen.Select(Series, Gen.Int[1, 9], Gen.Int[1, 9]).Sample((series, factor, weight) =>
        {
            var (plain, scaled) = (Of(series, 1, 1), Of(series, factor, weight));
            Assert.Equal(double.IsNaN(plain.Variance), double.IsNaN(scaled.Variance));
            if (!double.IsNaN(plain.Variance))
            {
                Assert.Equal(factor * factor * plain.Variance, scaled.Variance, 1e-4 * (1 + Math.Abs(scaled.Variance)));
                Assert.Equal(plain.DegreesOfFreedom, scaled.DegreesOfFreedom, 1e-3);
            }
        });

    [Fact]
    public void Degrees_of_freedom_lie_between_one_and_those_of_the_days() => Gen.Select(Series, Gen.Int[1, 5]).Sample((series, weight) =>
    {
        var result = Of(series, 1, weight);
        if (!double.IsNaN(result.Variance))
        {
            Assert.True(result.Variance >= 0);
            Assert.InRange(result.DegreesOfFreedom, 1, Math.Max(1, series.Count - 1));
        }
    });

    // Alternating days have no correlation to speak of, days in runs have much.
    [Fact]
    public void Correlation_widens_the_uncertainty()
    {
        int[] days = [.. Enumerable.Range(1, 30)];
        var months = days.Select(_ => 1).ToArray();
        var alternating = Of(days, months, [.. days.Select(day => day % 2 == 0 ? 1f : -1f)]);
        var runs = Of(days, months, [.. days.Select(day => day <= 15 ? 1f : -1f)]);
        Assert.True(runs.Variance > 5 * alternating.Variance);
        Assert.True(runs.DegreesOfFreedom < alternating.DegreesOfFreedom);
        Assert.Equal(1.0 / 29, alternating.Variance, 1e-6);
    }

    private static readonly Gen<List<(int Day, int Value)>> Series =
        Gen.Select(Gen.Int[0, 89], Gen.Int[-5, 5]).List[0, 60].Select(days => days.DistinctBy(day => day.Item1).OrderBy(day => day.Item1).ToList());

    private static MeanUncertainty Of(List<(int Day, int Value)> series, int factor, int weight)
    {
        var deviations = series.Select(day => (float)(factor * (day.Value - series.Where(other => other.Day / 30 == day.Day / 30).Average(other => other.Value)))).ToArray();
        return DaySeries.Of(new()
        {
            Days = series.Select(day => day.Day).ToArray(),
            Months = series.Select(day => day.Day / 30).ToArray(),
            Weights = series.Select(_ => (float)weight).ToArray(),
            Counts = series.Select(_ => 1f).ToArray(),
            Deviations = deviations,
        });
    }

    private static MeanUncertainty Of(int[] days, int[] months, float[] deviations) => DaySeries.Of(new()
    {
        Days = days,
        Months = months,
        Weights = days.Select(_ => 1f).ToArray(),
        Counts = days.Select(_ => 1f).ToArray(),
        Deviations = deviations,
    });
}
