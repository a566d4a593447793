namespace Bandtide.Core.Sun;

/// <summary>How far a sundial is ahead of a mean clock.</summary>
public static class EquationOfTime
{
    /// <summary>Apparent minus mean solar time in minutes, -14.3 to 16.5; positive when the sundial is ahead.</summary>
    /// <remarks>By definition: hour angle of the apparent less that of the mean Sun (Meeus, Astronomical Algorithms, 2nd ed.,
    /// chapter 28); better than 0.02 minutes from 1950 to 2050.</remarks>
    public static double Minutes(DateTimeOffset instant) => ApparentSun.At(instant).EquationOfTimeMinutes;
}
