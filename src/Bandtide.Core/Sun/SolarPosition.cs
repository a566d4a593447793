using Bandtide.Core.Geography;

namespace Bandtide.Core.Sun;

/// <summary>Direction of the Sun's centre from a place at sea level, geometric: without refraction.</summary>
/// <remarks>
/// Better than 0.005 degrees from 1950 to 2050; most of what remains is that UTC stands for UT1. Source: Reda and Andreas,
/// NREL/TP-560-34302 (rev. 2008), steps 3.11 to 3.15, parallax included.
/// </remarks>
/// <param name="ElevationDegrees">Angle above the horizon, -90 to 90.</param>
/// <param name="AzimuthDegrees">Clockwise from north, 0 up to 360.</param>
public readonly record struct SolarPosition(double ElevationDegrees, double AzimuthDegrees)
{
    // Flattening of the Earth: polar over equatorial radius.
    private const double AxisRatio = 0.99664719;

    /// <summary>The Sun's direction from a place at an instant.</summary>
    public static SolarPosition At(GeoPoint place, DateTimeOffset instant)
    {
        var sun = ApparentSun.At(instant);
        return Of(place, sun.DeclinationDegrees, sun.GreenwichHourAngleDegrees, sun.DistanceAstronomicalUnits);
    }

    /// <summary>Elevation of the Sun's centre in degrees, -90 to 90.</summary>
    public static double ElevationAt(GeoPoint place, DateTimeOffset instant) => At(place, instant).ElevationDegrees;

    /// <summary>The place that has the Sun in its zenith.</summary>
    public static GeoPoint Subsolar(DateTimeOffset instant)
    {
        var sun = ApparentSun.At(instant);
        return new(sun.DeclinationDegrees, Angles.Wrap180(-sun.GreenwichHourAngleDegrees));
    }

    /// <summary>From geocentric coordinates to the direction seen at a place.</summary>
    internal static SolarPosition Of(GeoPoint place, double declinationDegrees, double greenwichHourAngleDegrees, double distanceAstronomicalUnits)
    {
        var (sinLatitude, cosLatitude) = Math.SinCos(double.DegreesToRadians(place.LatitudeDegrees));
        var (sinDeclination, cosDeclination) = Math.SinCos(double.DegreesToRadians(declinationDegrees));
        var hourAngle = double.DegreesToRadians(greenwichHourAngleDegrees + place.LongitudeDegrees);
        var (sinHour, cosHour) = Math.SinCos(hourAngle);
        var parallax = Math.Sin(double.DegreesToRadians(8.794 / 3600 / distanceAstronomicalUnits));

        // Place of the observer in the meridian plane, in equatorial radii.
        var reduced = Math.Atan2(AxisRatio * sinLatitude, cosLatitude);
        var (outward, northward) = (Math.Cos(reduced), AxisRatio * Math.Sin(reduced));

        // The Sun seen from there: geocentric direction less the observer's place, axes outward in the meridian, west, north.
        var x = cosDeclination * cosHour - outward * parallax;
        var y = cosDeclination * sinHour;
        var z = sinDeclination - northward * parallax;
        var up = z * sinLatitude + x * cosLatitude;
        var north = z * cosLatitude - x * sinLatitude;
        return new(
            double.RadiansToDegrees(Math.Atan2(up, Math.Sqrt(north * north + y * y))),
            Angles.Wrap360(double.RadiansToDegrees(Math.Atan2(-y, north))));
    }
}
