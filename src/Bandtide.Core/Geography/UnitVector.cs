namespace Bandtide.Core.Geography;

/// <summary>A direction from the Earth's centre: x to 0 N 0 E, y to 0 N 90 E, z to the north pole. Sums need not have length 1.</summary>
internal readonly record struct UnitVector(double X, double Y, double Z)
{
    public static UnitVector Of(GeoPoint point)
    {
        var (sinLat, cosLat) = Math.SinCos(double.DegreesToRadians(point.LatitudeDegrees));
        var (sinLon, cosLon) = Math.SinCos(double.DegreesToRadians(point.LongitudeDegrees));
        return new(cosLat * cosLon, cosLat * sinLon, sinLat);
    }

    public GeoPoint ToPoint() => new(
        double.RadiansToDegrees(Math.Atan2(Z, Math.Sqrt(X * X + Y * Y))),
        double.RadiansToDegrees(Math.Atan2(Y, X)));

    /// <summary>Angle between two directions in radians, 0 to pi.</summary>
    public double AngleTo(UnitVector other)
    {
        var (x, y, z) = (Y * other.Z - Z * other.Y, Z * other.X - X * other.Z, X * other.Y - Y * other.X);
        return Math.Atan2(Math.Sqrt(x * x + y * y + z * z), X * other.X + Y * other.Y + Z * other.Z);
    }

    public static UnitVector operator +(UnitVector a, UnitVector b) => new(a.X + b.X, a.Y + b.Y, a.Z + b.Z);

    public static UnitVector operator *(double factor, UnitVector a) => new(factor * a.X, factor * a.Y, factor * a.Z);
}
