using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Time;

public sealed class SeasonsTests
{
    // Meteorological seasons; the one over New Year takes January's year.
    [Theory]
    [InlineData(Season.Winter, Hemisphere.North, "2025-12")]
    [InlineData(Season.Spring, Hemisphere.North, "2026-03")]
    [InlineData(Season.Summer, Hemisphere.North, "2026-06")]
    [InlineData(Season.Autumn, Hemisphere.North, "2026-09")]
    [InlineData(Season.Winter, Hemisphere.South, "2026-06")]
    [InlineData(Season.Spring, Hemisphere.South, "2026-09")]
    [InlineData(Season.Summer, Hemisphere.South, "2025-12")]
    [InlineData(Season.Autumn, Hemisphere.South, "2026-03")]
    public void Months_of_the_seasons_of_2026(Season season, Hemisphere hemisphere, string first)
    {
        var month = YearMonth.Parse(first);
        Assert.Equal([month, month.AddMonths(1), month.AddMonths(2)], Seasons.Months(season, 2026, hemisphere));
    }

    [Fact]
    public void Every_month_belongs_to_the_season_that_lists_it() =>
        Gen.Select(Samples.Month, Gen.Enum<Hemisphere>()).Sample((month, hemisphere) =>
        {
            var (season, year) = Seasons.Of(month, hemisphere);
            return Seasons.Months(season, year, hemisphere).Contains(month);
        });

    [Theory]
    [InlineData(0, Hemisphere.North)]
    [InlineData(-0.0001, Hemisphere.South)]
    [InlineData(60, Hemisphere.North)]
    public void The_equator_counts_as_north(double latitude, Hemisphere hemisphere) =>
        Assert.Equal(hemisphere, Seasons.HemisphereOf(latitude));

    [Theory]
    [InlineData(0, false)]
    [InlineData(15, false)]
    [InlineData(-15, false)]
    [InlineData(15.01, true)]
    [InlineData(-15.01, true)]
    public void Seasons_mean_nothing_near_the_equator(double latitude, bool meaningful) =>
        Assert.Equal(meaningful, Seasons.IsMeaningful(latitude));
}
