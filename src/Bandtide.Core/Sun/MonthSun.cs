using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sun;

/// <summary>Sunrise and sunset of a month's 15th as hours of a chosen clock, to be drawn into a picture of the month.</summary>
/// <param name="Status">Which of the two exist.</param>
/// <param name="RiseHour">Hour of sunrise, 0 up to but not including 24, or <c>null</c>.</param>
/// <param name="SetHour">Hour of sunset, 0 up to but not including 24, or <c>null</c>; below the hour of sunrise where the
/// light of one day spans midnight of the clock.</param>
public readonly record struct MonthSun(SunDayStatus Status, double? RiseHour, double? SetHour)
{
    private const int MiddleDay = 15;

    /// <summary>Sunrise and sunset at a place on the local mean 15th of a month.</summary>
    /// <param name="place">The place.</param>
    /// <param name="month">The month.</param>
    /// <param name="clock">Hours of UTC, or of local apparent solar time.</param>
    public static MonthSun RiseSet(GeoPoint place, YearMonth month, HourClock clock)
    {
        var sun = SolarEvents.Of(place, month.FirstDay.AddDays(MiddleDay - 1)).Sun;
        return new(sun.Status, Hour(sun.Rising), Hour(sun.Setting));

        double? Hour(DateTimeOffset? instant) => instant is not { } passage
            ? null
            : clock == HourClock.Solar
                ? ApparentSolarTime.At(passage, place.LongitudeDegrees).Hours
                : passage.UtcDateTime.TimeOfDay.TotalHours;
    }
}
