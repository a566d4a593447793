using Bandtide.Core.Geography;

namespace Bandtide.Server.Demo;

/// <summary>A point on a path where the ionosphere decides what gets through.</summary>
internal sealed class DemoControlPoint
{
    // Cosine and sine of the hour angle that the middle of each hour UTC has against noon UTC.
    private static readonly (float Cos, float Sin)[] HourAngle =
        [.. Enumerable.Range(0, 24).Select(hour => MathF.SinCos((hour - 11.5f) * MathF.PI / 12)).Select(pair => (pair.Cos, pair.Sin))];

    private readonly double sinLatitude;
    private readonly double cosLatitude;
    private readonly double longitudeDegrees;

    public DemoControlPoint(GeoPoint place)
    {
        (sinLatitude, cosLatitude) = Math.SinCos(double.DegreesToRadians(place.LatitudeDegrees));
        longitudeDegrees = place.LongitudeDegrees;
        var latitude = (float)Math.Abs(place.LatitudeDegrees);
        StormShare = 0.12f + 0.88f * Smooth(latitude, 22, 62);
        AuroralShare = Smooth(latitude, 54, 68);
        LayerShare = 1.08f - 0.08f * Smooth(latitude, 5, 25) - 0.24f * Smooth(latitude, 48, 76);
    }

    /// <summary>How much of a storm's loss of critical frequency is felt here, 0 to 1. Invented, rising with latitude.</summary>
    public float StormShare { get; }

    /// <summary>How much a storm absorbs here, 0 to 1. Invented: the auroral zone alone.</summary>
    public float AuroralShare { get; }

    /// <summary>Critical frequency against that of middle latitudes. Invented: more at the equator, less near the poles.</summary>
    public float LayerShare { get; }

    /// <summary>Cosine of the solar zenith angle in the middle of each hour of a day.</summary>
    /// <param name="day">The day.</param>
    /// <param name="cosZenith">Receives 24 values.</param>
    public void Fill(DemoDay day, Span<float> cosZenith)
    {
        var (sinDeclination, cosDeclination) = Math.SinCos(double.DegreesToRadians(day.DeclinationDegrees));
        var (sinNoon, cosNoon) = Math.SinCos(double.DegreesToRadians(longitudeDegrees - day.SubsolarLongitudeDegrees));
        var still = (float)(sinLatitude * sinDeclination);
        var (even, odd) = ((float)(cosLatitude * cosDeclination * cosNoon), (float)(cosLatitude * cosDeclination * sinNoon));
        for (var hour = 0; hour < 24; hour++)
        {
            cosZenith[hour] = still + even * HourAngle[hour].Cos - odd * HourAngle[hour].Sin;
        }
    }

    /// <summary>From 0 at the low end to 1 at the high end, level at both.</summary>
    public static float Smooth(float value, float low, float high)
    {
        var t = Math.Clamp((value - low) / (high - low), 0, 1);
        return t * t * (3 - 2 * t);
    }
}
