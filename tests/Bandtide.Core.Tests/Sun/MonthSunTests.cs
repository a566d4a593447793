using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Sun;

public sealed class MonthSunTests
{
    // Any almanac: at the equator the Sun is up for 12 h 7 min all year, with refraction and the Sun's radius.
    [Fact]
    public void On_the_equator_the_Sun_rises_shortly_before_six_solar_hours() =>
        Gen.Select(Gen.Double[-180, 180], Samples.Month).Sample((longitude, month) =>
        {
            var sun = MonthSun.RiseSet(new(0, longitude), month, HourClock.Solar);
            Assert.Equal(SunDayStatus.Normal, sun.Status);
            Assert.Equal(6 - 3.5 / 60, sun.RiseHour!.Value, 0.5 / 60);
            Assert.Equal(18 + 3.5 / 60, sun.SetHour!.Value, 0.5 / 60);
        });

    // solar_events_grid.csv, row 3: 60 N 30 E, 2017-03-20, sunrise 04:01:35. Five days earlier the day is some 13 minutes
    // shorter on the morning side (declination 1.98 degrees lower at 60 N).
    [Fact]
    public void Hours_of_UTC_are_those_of_the_fifteenth()
    {
        var place = new GeoPoint(60, 30);
        var events = SolarEvents.Of(place, new(2017, 3, 15));
        var sun = MonthSun.RiseSet(place, new(2017, 3), HourClock.Utc);
        Assert.Equal(events.Sun.Rising!.Value.UtcDateTime.TimeOfDay.TotalHours, sun.RiseHour!.Value, 1e-9);
        Assert.Equal(4 + 1.6 / 60 + 15.0 / 60, sun.RiseHour.Value, 3.0 / 60);
    }

    [Fact]
    public void Light_that_spans_midnight_of_the_clock_sets_before_it_rises()
    {
        var sun = MonthSun.RiseSet(new(35.7, 139.8), new(2025, 6), HourClock.Utc);
        Assert.True(sun.SetHour < sun.RiseHour);
    }

    [Theory]
    [InlineData("2025-06", SunDayStatus.PolarDay)]
    [InlineData("2025-12", SunDayStatus.PolarNight)]
    public void Beyond_the_polar_circle_there_is_nothing_to_draw(string month, SunDayStatus status) =>
        Assert.Equal(new MonthSun(status, null, null), MonthSun.RiseSet(new(70, 25), YearMonth.Parse(month), HourClock.Solar));
}
