namespace Bandtide.Core.Geography;

/// <summary>Countries that belong to one ITU Region as a whole although a dividing line runs through or west of them.</summary>
/// <remarks>
/// Radio Regulations Nos. 5.3 and 5.5: Armenia, Azerbaijan, the Russian Federation, Georgia, Kazakhstan, Mongolia, Uzbekistan,
/// Kyrgyzstan, Tajikistan, Turkmenistan, Turkey and Ukraine, with the seas north of Russia, are Region 1; Iran is Region 3.
/// The outlines are this project's own, read off a map to about half a degree, and only as far as the lines leave it open.
/// </remarks>
internal static class ItuTerritories
{
    // From eastern Turkey along the southern borders to the Pacific, then around Kamchatka to the Bering Strait and the pole.
    private static readonly (double Latitude, double Longitude)[] RegionOne =
    [
        (90, 38), (36.7, 38), (36.8, 40), (37.2, 42.4), (37.3, 44.8), (38.4, 44.3), (39.7, 44.6), (38.9, 46.2), (39.5, 47.9), (38.4, 48.9),
        (37.4, 53.8), (38.1, 55.6), (38.2, 57.2), (37.5, 59.3), (36.6, 61.1), (35.3, 61.3), (35.3, 62.4), (36.2, 64.5),
        (37.4, 66.5), (37.1, 68), (37.1, 69.4), (37.9, 70.3), (36.7, 71.6), (37.4, 73.3), (37.3, 74.9), (38.4, 74.9),
        (39.5, 73.7), (40.4, 76.2), (41.1, 78.2), (42.1, 80.2), (43.1, 80.5), (45, 80.3), (45.3, 82.5), (47, 83), (47.2, 85.5),
        (49.1, 87.5), (48, 89), (46.9, 90.9), (45.2, 91), (44.3, 95.3), (42.7, 96.4), (42.5, 101.6), (41.6, 105), (42.4, 109.3),
        (43.7, 111.9), (44.9, 113.6), (46.4, 116.6), (46.7, 119.8), (47.9, 118), (47.8, 115.6), (49.8, 116.7), (50.1, 119.3),
        (53.2, 120.9), (53.2, 124.5), (50.2, 127.4), (48.9, 130.6), (47.7, 131), (48.3, 134.8), (45.2, 133.1), (44.9, 131),
        (43, 131.2), (42.4, 130.6), (42.3, 132), (45.8, 139.5), (45.7, 142), (44, 145.4), (43.4, 146.2), (50, 158), (54, 168.5),
        (60, 179), (65.5, 191), (90, 191),
    ];

    private static readonly (double Latitude, double Longitude)[] Iran =
    [
        (39.7, 44.6), (38.4, 44.3), (37.3, 44.8), (35.8, 45.7), (34.5, 45.5), (33.1, 46.1), (32.2, 47.6), (31, 47.7), (30, 48.5),
        (28.5, 50.5), (27, 52.5), (26, 54), (26.6, 56.3), (25.1, 57.3), (24.9, 61.6), (27, 63), (28.5, 62.8), (29.8, 60.9), (31.3, 61.8),
        (34, 60.6), (36.6, 61.1), (37.5, 59.3), (38.2, 57.2), (38.1, 55.6), (37.4, 53.8), (38.4, 48.9), (39.5, 47.9), (38.9, 46.2),
    ];

    /// <summary>The Region of the territory that holds a point, or <c>null</c> where the dividing lines decide.</summary>
    public static int? RegionOf(GeoPoint point) => Holds(RegionOne, point) ? 1 : Holds(Iran, point) ? 3 : null;

    // Even-odd rule in plain degrees; the outlines pass 180 degrees eastward, so western longitudes follow on there.
    private static bool Holds((double Latitude, double Longitude)[] outline, GeoPoint point)
    {
        var longitude = point.LongitudeDegrees < -150 ? point.LongitudeDegrees + 360 : point.LongitudeDegrees;
        var inside = false;
        for (var i = 0; i < outline.Length; i++)
        {
            var (a, b) = (outline[i], outline[(i + 1) % outline.Length]);
            if (a.Longitude <= longitude != b.Longitude <= longitude)
            {
                var crossing = a.Latitude + (longitude - a.Longitude) / (b.Longitude - a.Longitude) * (b.Latitude - a.Latitude);
                inside ^= crossing > point.LatitudeDegrees;
            }
        }

        return inside;
    }
}
