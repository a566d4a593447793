namespace Bandtide.Core.Sun;

/// <summary>Local apparent solar time: what a sundial shows, 12 when the Sun crosses the meridian.</summary>
/// <param name="Hours">Hours since local apparent midnight, 0 up to but not including 24.</param>
/// <param name="DayOffset">Local apparent date minus UTC date: -1, 0 or 1.</param>
public readonly record struct ApparentSolarTime(double Hours, int DayOffset)
{
    /// <summary>Apparent solar time at an instant.</summary>
    /// <param name="instant">The instant.</param>
    /// <param name="longitudeDegrees">East positive, -180 to 180.</param>
    /// <remarks>UTC hours + longitude / 15 + equation of time.</remarks>
    public static ApparentSolarTime At(DateTimeOffset instant, double longitudeDegrees)
    {
        var hours = instant.UtcDateTime.TimeOfDay.TotalHours + longitudeDegrees / 15 + EquationOfTime.Minutes(instant) / 60;
        var dayOffset = (int)Math.Floor(hours / 24);
        var hourOfDay = hours - 24 * dayOffset;

        // An instant before midnight by less than a double can tell rounds up to midnight.
        return hourOfDay < 24 ? new(hourOfDay, dayOffset) : new(0, dayOffset + 1);
    }
}
