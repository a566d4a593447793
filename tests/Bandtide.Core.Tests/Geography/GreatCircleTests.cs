using Bandtide.Core.Geography;
using Bandtide.Testing;
using CsCheck;

namespace Bandtide.Core.Tests.Geography;

/// <summary>Against GeographicLib on the same sphere; see the README of the reference files.</summary>
public sealed class GreatCircleTests
{
    [Fact]
    public void Distance_bearing_and_midpoint_agree_with_GeographicLib() => Assert.All(ReferenceTable.Load("great_circle.csv"), row =>
    {
        var (from, to) = (new GeoPoint(row.Number("lat1"), row.Number("lon1")), new GeoPoint(row.Number("lat2"), row.Number("lon2")));
        Assert.Equal(row.Number("sphere_R6371.0088_distance_km"), GreatCircle.DistanceKilometres(from, to), 1e-6);
        if (!string.Equals(row.Text("bearing_defined"), "true", StringComparison.Ordinal))
        {
            Assert.InRange(GreatCircle.InitialBearingDegrees(from, to), 0, 360);
            return;
        }

        Assert.Equal(0, Angles.Wrap180(row.Number("sphere_initial_bearing_deg") - GreatCircle.InitialBearingDegrees(from, to)), 1e-5);

        // Compared as places, not as numbers: at a pole and on the antimeridian one place has several longitudes. A tenth
        // of a metre is the rounding of the six decimals in the file.
        var midpoint = new GeoPoint(row.Number("sphere_midpoint_lat"), row.Number("sphere_midpoint_lon"));
        Assert.Equal(0, GreatCircle.DistanceKilometres(midpoint, GreatCircle.Midpoint(from, to)), 1e-4);
    });

    [Fact]
    public void Distance_is_within_the_known_error_of_a_sphere_from_the_ellipsoid() => Assert.All(ReferenceTable.Load("great_circle.csv"), row =>
    {
        var (from, to) = (new GeoPoint(row.Number("lat1"), row.Number("lon1")), new GeoPoint(row.Number("lat2"), row.Number("lon2")));
        var ellipsoid = row.Number("wgs84_distance_m") / 1000;
        Assert.InRange(GreatCircle.DistanceKilometres(from, to), ellipsoid * (1 - 0.0056), ellipsoid * (1 + 0.0056));
    });

    [Fact]
    public void Distance_is_a_metric() =>
        Gen.Select(Samples.Point, Samples.Point, Samples.Point).Sample((a, b, c) =>
        {
            var (ab, bc, ca) = (GreatCircle.DistanceKilometres(a, b), GreatCircle.DistanceKilometres(b, c), GreatCircle.DistanceKilometres(c, a));
            return GreatCircle.DistanceKilometres(a, a) == 0 && Math.Abs(ab - GreatCircle.DistanceKilometres(b, a)) < 1e-9
                && ab is >= 0 and <= 20015.12 && ab <= bc + ca + 1e-9;
        });

    [Fact]
    public void The_midpoint_halves_the_way() =>
        Gen.Select(Samples.Point, Samples.Point).Where((a, b) => GreatCircle.DistanceKilometres(a, b) < 20000).Sample((a, b) =>
        {
            var midpoint = GreatCircle.Midpoint(a, b);
            var half = GreatCircle.DistanceKilometres(a, b) / 2;
            return Math.Abs(GreatCircle.DistanceKilometres(a, midpoint) - half) < 1e-6
                && Math.Abs(GreatCircle.DistanceKilometres(midpoint, b) - half) < 1e-6;
        });
}
