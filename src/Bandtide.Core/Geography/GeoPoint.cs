namespace Bandtide.Core.Geography;

/// <summary>A place on the Earth in geographic degrees (WGS 84), without height.</summary>
/// <remarks><c>default</c> is the point where the equator meets the prime meridian.</remarks>
/// <param name="LatitudeDegrees">North positive, -90 to 90.</param>
/// <param name="LongitudeDegrees">East positive, -180 to 180 (both name the same meridian).</param>
/// <exception cref="ArgumentOutOfRangeException">Not finite or out of range.</exception>
public readonly record struct GeoPoint(double LatitudeDegrees, double LongitudeDegrees)
{
    /// <summary>Latitude in degrees, north positive, -90 to 90.</summary>
    public double LatitudeDegrees { get; } = IsWithin(LatitudeDegrees, 90)
        ? LatitudeDegrees
        : throw new ArgumentOutOfRangeException(nameof(LatitudeDegrees), LatitudeDegrees, "Latitude must be -90 to 90 degrees.");

    /// <summary>Longitude in degrees, east positive, -180 to 180.</summary>
    public double LongitudeDegrees { get; } = IsWithin(LongitudeDegrees, 180)
        ? LongitudeDegrees
        : throw new ArgumentOutOfRangeException(nameof(LongitudeDegrees), LongitudeDegrees, "Longitude must be -180 to 180 degrees.");

    /// <summary>Makes a point of two numbers if they are finite and in range.</summary>
    public static bool TryCreate(double latitudeDegrees, double longitudeDegrees, out GeoPoint point)
    {
        var valid = IsWithin(latitudeDegrees, 90) && IsWithin(longitudeDegrees, 180);
        point = valid ? new(latitudeDegrees, longitudeDegrees) : default;
        return valid;
    }

    // False for NaN as well.
    private static bool IsWithin(double value, double limit) => Math.Abs(value) <= limit;
}
