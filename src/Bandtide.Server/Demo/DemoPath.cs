using Bandtide.Core.Geography;

namespace Bandtide.Server.Demo;

/// <summary>The way from a source to a station.</summary>
internal sealed class DemoPath
{
    private const double LongestHopKilometres = 3500;
    private const double LongPathKilometres = 4000;
    private const double ControlPointKilometres = 2000;

    public DemoPath(DemoSource source, GeoPoint station)
    {
        Source = source;

        // A source is wide: nothing is nearer than this on average.
        DistanceKilometres = Math.Max(350, GreatCircle.DistanceKilometres(source.Place, station));
        var hops = (int)Math.Ceiling(DistanceKilometres / LongestHopKilometres);
        var hop = DistanceKilometres / hops;
        MufFactor = DemoLayer.ObliquityFactor(hop);
        DistanceDb = (float)(20 * Math.Log10(DistanceKilometres / 500) + 4 * (hops - 1));

        // Two control points for a long path: ITU-R P.533, section 3 (from memory).
        var share = ControlPointKilometres / DistanceKilometres;
        Points = DistanceKilometres <= LongPathKilometres
            ? [new(GreatCircle.Midpoint(source.Place, station))]
            : [new(Between(station, source.Place, share)), new(Between(source.Place, station, share))];
        LossPerPoint = hops * SlantThroughD(hop) / Points.Count;
    }

    /// <summary>Where it begins.</summary>
    public DemoSource Source { get; }

    /// <summary>Length over the ground.</summary>
    public double DistanceKilometres { get; }

    /// <summary>Loss by distance and by reflections from the ground, dB against 500 km.</summary>
    public float DistanceDb { get; }

    /// <summary>Highest usable over critical frequency.</summary>
    public float MufFactor { get; }

    /// <summary>How much more is absorbed than on one vertical path, for each control point.</summary>
    public float LossPerPoint { get; }

    /// <summary>One or two.</summary>
    public IReadOnlyList<DemoControlPoint> Points { get; }

    /// <summary>How loudly the source speaks at the station among all sources: invented, falling with distance.</summary>
    public float Weight(DemoUse use) => Source.Weight(use) * (float)Math.Exp(-DistanceKilometres / 7000);

    // Ray through the D region, 80 km high, by the elevation angle of the hop: at most five times the vertical way.
    private static float SlantThroughD(double hopKilometres)
    {
        const double Radius = 6371;
        var half = hopKilometres / 2 / Radius;
        var elevation = Math.Max(0, Math.Atan2(Math.Cos(half) - Radius / (Radius + 300), Math.Sin(half)));
        var atLayer = Math.Asin(Math.Min(1, Math.Cos(elevation) * Radius / (Radius + 80)));
        return (float)Math.Min(5, 1 / Math.Cos(atLayer));
    }

    private static GeoPoint Between(GeoPoint from, GeoPoint to, double share)
    {
        // Halving the way finds the place to a few kilometres; finer would mean nothing here.
        var (near, far, low, high) = (from, to, 0.0, 1.0);
        for (var step = 0; step < 12; step++)
        {
            var (middle, at) = (GreatCircle.Midpoint(near, far), (low + high) / 2);
            (near, low, far, high) = at < share ? (middle, at, far, high) : (near, low, middle, at);
        }

        return near;
    }
}
