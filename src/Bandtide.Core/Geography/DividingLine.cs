namespace Bandtide.Core.Geography;

/// <summary>A line from the north pole to the south pole along great circles and parallels, one longitude for each latitude.</summary>
internal sealed class DividingLine
{
    private const int PartsPerArc = 64;
    private readonly (double Latitude, double Longitude)[] points;

    /// <summary>Corners in degrees from north to south. Corners of one latitude are joined by the parallel, others by a great circle.</summary>
    public DividingLine(params (double Latitude, double Longitude)[] corners)
    {
        points = [.. corners[..^1].Zip(corners[1..]).SelectMany(pair => Arc(pair.First, pair.Second)), corners[^1]];
    }

    /// <summary>Longitude in degrees where the line crosses a latitude; on a stretch along a parallel its southern end.</summary>
    public double LongitudeAt(double latitude)
    {
        var south = Array.FindIndex(points, 1, point => point.Latitude <= latitude);
        while (south + 1 < points.Length && points[south + 1].Latitude >= latitude)
        {
            south++;
        }

        var (a, b) = (points[south - 1], points[south]);
        var share = a.Latitude > b.Latitude ? (a.Latitude - latitude) / (a.Latitude - b.Latitude) : 1;
        return a.Longitude + share * Angles.Wrap180(b.Longitude - a.Longitude);
    }

    private static IEnumerable<(double Latitude, double Longitude)> Arc((double Latitude, double Longitude) from, (double Latitude, double Longitude) to)
    {
        yield return from;

        // A meridian and a parallel are straight in these coordinates already.
        if (from.Longitude == to.Longitude || from.Latitude == to.Latitude)
        {
            yield break;
        }

        var (start, end) = (UnitVector.Of(new(from.Latitude, from.Longitude)), UnitVector.Of(new(to.Latitude, to.Longitude)));
        var angle = start.AngleTo(end);
        for (var i = 1; i < PartsPerArc; i++)
        {
            var part = (double)i / PartsPerArc;
            var point = (Math.Sin((1 - part) * angle) * start + Math.Sin(part * angle) * end).ToPoint();
            yield return (point.LatitudeDegrees, point.LongitudeDegrees);
        }
    }
}
