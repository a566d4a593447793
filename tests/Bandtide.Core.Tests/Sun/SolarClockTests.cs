using Bandtide.Core.Sun;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Sun;

public sealed class SolarClockTests
{
    [Fact]
    public void A_cell_of_mid_month_goes_to_the_solar_hour_that_holds_its_midpoint_or_the_one_next_to_it_at_a_border() =>
        Gen.Select(Gen.Double[-180, 180], Samples.Month, Gen.Int[0, 23]).Sample((longitude, month, hour) =>
        {
            var midpoint = new DateTimeOffset(month.FirstDay.AddDays(month.Days / 2), new(hour, 30), TimeSpan.Zero);
            var apparent = ApparentSolarTime.At(midpoint, longitude).Hours;
            var solarHour = (hour + SolarClock.Shift(longitude, month)) % 24;
            var apart = Math.Abs(solarHour + 0.5 - apparent);

            // Half an hour, and half a minute for mid-month against the month's mean of the equation of time.
            return Math.Min(apart, 24 - apart) <= 0.5 + 0.5 / 60;
        });

    [Fact]
    public void Shift_moves_on_by_one_hour_every_fifteen_degrees_eastward() =>
        Gen.Select(Gen.Double[-180, 165], Samples.Month).Sample((longitude, month) =>
            (SolarClock.Shift(longitude, month) + 1) % 24 == SolarClock.Shift(longitude + 15, month));

    [Fact]
    public void Shift_never_skips_an_hour() =>
        Gen.Select(Gen.Double[-180, 179], Gen.Double[0, 1], Samples.Month).Sample((longitude, step, month) =>
            (SolarClock.Shift(longitude + step, month) - SolarClock.Shift(longitude, month) + 24) % 24 is 0 or 1);

    // By hand: 15 degrees east and west of Greenwich; at 7.5 degrees the equation of time decides (+16 min in November,
    // -14 min in February).
    [Theory]
    [InlineData(0, "2025-06", 0)]
    [InlineData(15, "2025-06", 1)]
    [InlineData(-15, "2025-06", 23)]
    [InlineData(180, "2025-06", 12)]
    [InlineData(-180, "2025-06", 12)]
    [InlineData(7.5, "2025-11", 1)]
    [InlineData(7.5, "2025-02", 0)]
    [InlineData(-7.5, "2025-11", 0)]
    [InlineData(-7.5, "2025-02", 23)]
    public void Shift_by_hand(double longitude, string month, int shift) =>
        Assert.Equal(shift, SolarClock.Shift(longitude, YearMonth.Parse(month)));

    [Fact]
    public void Mean_equation_of_time_lies_between_the_extremes_of_the_month() =>
        Samples.Month.Sample(month =>
        {
            var noon = new DateTimeOffset(month.FirstDay, new(12, 0), TimeSpan.Zero);
            var days = Enumerable.Range(0, month.Days).Select(day => EquationOfTime.Minutes(noon.AddDays(day))).ToList();
            return SolarClock.MeanEquationOfTimeMinutes(month) >= days.Min() && SolarClock.MeanEquationOfTimeMinutes(month) <= days.Max();
        }, iter: 40);
}
