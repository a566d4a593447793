namespace Bandtide.Core.Geography;

/// <summary>First guess of the ITU Region of a place.</summary>
/// <remarks>
/// Radio Regulations, Article 5, Nos. 5.2 to 5.9: Region 1 lies between line B and line A, Region 3 between A and C, Region 2
/// between C and B; but some countries belong to a Region as a whole whatever the lines say (<see cref="ItuTerritories"/>, drawn
/// coarsely here). Close to such a border, and on ships, the guess can be wrong: the operator's word stands above it.
/// </remarks>
public static class ItuRegions
{
    // No. 5.7.
    private static readonly DividingLine LineA = new((90, 40), (40, 40), (23.44, 60), (-90, 60));

    // No. 5.8.
    private static readonly DividingLine LineB = new((90, -10), (72, -10), (40, -50), (-10, -20), (-90, -20));

    // No. 5.9; the boundary in the Bering Strait runs along 168 degrees 58 minutes 37 seconds west.
    private static readonly DividingLine LineC = new((90, -168.977), (65.5, -168.977), (50, 165), (10, -170), (10, -120), (-90, -120));

    /// <summary>The Region, 1 to 3, that the position suggests.</summary>
    public static int Guess(GeoPoint point) => ItuTerritories.RegionOf(point) ?? ByLines(point);

    private static int ByLines(GeoPoint point)
    {
        var lineB = LineB.LongitudeAt(point.LatitudeDegrees);
        var eastOfB = Angles.Wrap360(point.LongitudeDegrees - lineB);
        if (eastOfB < Angles.Wrap360(LineA.LongitudeAt(point.LatitudeDegrees) - lineB))
        {
            return 1;
        }

        return eastOfB < Angles.Wrap360(LineC.LongitudeAt(point.LatitudeDegrees) - lineB) ? 3 : 2;
    }
}
