using Bandtide.Core.Statistics;
using CsCheck;

namespace Bandtide.Core.Tests.Statistics;

public sealed class StationsAndDaysTests
{
    // Satterthwaite (1946): (a + b)^2 / (a^2/p + b^2/q). Station part 8/4 = 2 on 3 degrees, day part 2 on 5: 16/(4/3 + 4/5) = 7.5.
    [Fact]
    public void Two_equal_parts_by_hand()
    {
        var sum = StationsAndDays.Combine(8, 4, new(2, 5), rest: 0);
        Assert.Equal(4, sum.Variance, 1e-12);
        Assert.Equal(7.5, sum.DegreesOfFreedom, 1e-12);
    }

    [Fact]
    public void One_station_has_its_days_alone() => Assert.Equal(new(2, 5), StationsAndDays.Combine(double.NaN, 1, new(2, 5), rest: 0));

    [Fact]
    public void Unknown_days_leave_the_sum_unknown() =>
        Assert.True(double.IsNaN(StationsAndDays.Combine(8, 4, MeanUncertainty.Unknown, rest: 0).HalfWidth95));

    [Fact]
    public void The_rest_is_taken_off_the_days_once_and_never_makes_a_part_negative() => Gen.Select(Gen.Double[0, 10], Gen.Int[2, 40], Gen.Double[0, 10], Gen.Double[1, 30], Gen.Double[0, 10]).Sample(
        (stations, voters, days, freedom, rest) =>
        {
            var sum = StationsAndDays.Combine(stations, voters, new(days, freedom), rest);
            Assert.Equal(stations / voters + Math.Max(0, days - rest), sum.Variance, 1e-12);
            Assert.True(sum.DegreesOfFreedom >= 1 && sum.HalfWidth95 >= 0);
        });
}
