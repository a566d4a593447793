using Bandtide.Core.Geography;
using static Bandtide.Core.Sun.DeltaT;

namespace Bandtide.Core.Sun;

/// <summary>Where the Sun appears from the Earth's centre: nutation and aberration included.</summary>
/// <remarks>
/// Steps 3.1 to 3.10 of Reda and Andreas, Solar Position Algorithm, NREL/TP-560-34302 (rev. 2008); the report gives
/// 0.0003 degrees between the years -2000 and 6000 when the difference of the clocks is known, see <see cref="DeltaT"/>.
/// </remarks>
/// <param name="RightAscensionDegrees">Right ascension, 0 up to 360.</param>
/// <param name="DeclinationDegrees">Declination, -23.5 to 23.5.</param>
/// <param name="DistanceAstronomicalUnits">Distance from the Earth.</param>
/// <param name="GreenwichHourAngleDegrees">Hour angle at the prime meridian, westward, 0 up to 360.</param>
/// <param name="EquationOfTimeMinutes">Apparent minus mean solar time in minutes, as the hour angles give it. The usual series
/// (Meeus, equation 28.1) takes the mean Sun at TT instead of UT, which makes it 0.003 minutes greater in our times.</param>
internal readonly record struct ApparentSun(
    double RightAscensionDegrees, double DeclinationDegrees, double DistanceAstronomicalUnits, double GreenwichHourAngleDegrees, double EquationOfTimeMinutes)
{
    private const double DaysPerCentury = 36525;
    private const double SecondsPerDay = 86400;
    private static readonly DateTimeOffset J2000 = new(2000, 1, 1, 12, 0, 0, TimeSpan.Zero);

    /// <summary>The Sun at an instant.</summary>
    public static ApparentSun At(DateTimeOffset instant)
    {
        var days = (instant - J2000) / TimeSpan.FromDays(1);
        var centuries = (days + Seconds(days) / SecondsPerDay) / DaysPerCentury;
        var millennia = centuries / 10;
        var nutation = Nutation.At(centuries);
        var distance = EarthOrbit.Distance(millennia);
        var aberration = -20.4898 / 3600 / distance;
        var longitude = double.DegreesToRadians(EarthOrbit.LongitudeDegrees(millennia) + 180 + nutation.LongitudeDegrees + aberration);
        var latitude = double.DegreesToRadians(-EarthOrbit.LatitudeDegrees(millennia));
        var obliquity = double.DegreesToRadians(nutation.ObliquityDegrees);
        var rightAscension = Angles.Wrap360(double.RadiansToDegrees(Math.Atan2(
            Math.Sin(longitude) * Math.Cos(obliquity) - Math.Tan(latitude) * Math.Sin(obliquity), Math.Cos(longitude))));
        var declination = double.RadiansToDegrees(Math.Asin(
            Math.Sin(latitude) * Math.Cos(obliquity) + Math.Cos(latitude) * Math.Sin(obliquity) * Math.Sin(longitude)));
        var siderealTime = MeanSiderealTimeDegrees(days) + nutation.LongitudeDegrees * Math.Cos(obliquity);
        var hourAngle = Angles.Wrap360(siderealTime - rightAscension);
        return new(rightAscension, declination, distance, hourAngle, 4 * Angles.Wrap180(hourAngle - MeanHourAngleDegrees(days)));
    }

    // Of the mean Sun, which universal time follows: 0 at 12:00 UT.
    private static double MeanHourAngleDegrees(double days) => 360 * (days - Math.Floor(days));

    // Meeus, equation 12.4; the whole turns are taken off first to keep digits.
    private static double MeanSiderealTimeDegrees(double days)
    {
        var centuries = days / DaysPerCentury;
        return 280.46061837 + MeanHourAngleDegrees(days) + 0.98564736629 * days
            + Polynomial(centuries, [0, 0, 0.000387933, -1 / 38710000.0]);
    }
}
