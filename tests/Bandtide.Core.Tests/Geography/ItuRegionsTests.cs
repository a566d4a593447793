using Bandtide.Core.Geography;
using CsCheck;

namespace Bandtide.Core.Tests.Geography;

/// <summary>Radio Regulations, Article 5, Nos. 5.2 to 5.9: the Region of a place follows from its country and the lines.
/// Positions of the cities are from memory, to a tenth of a degree.</summary>
public sealed class ItuRegionsTests
{
    [Theory]
    [InlineData(1, "London", 51.5, -0.1)]
    [InlineData(1, "Reykjavik", 64.1, -21.9)]
    [InlineData(1, "Ponta Delgada", 37.7, -25.7)]
    [InlineData(1, "Dakar", 14.7, -17.5)]
    [InlineData(1, "Cape Town", -33.9, 18.4)]
    [InlineData(1, "Mauritius", -20.2, 57.5)]
    [InlineData(1, "Baghdad", 33.3, 44.4)]
    [InlineData(1, "Riyadh", 24.7, 46.7)]
    [InlineData(1, "Dubai", 25.2, 55.3)]
    [InlineData(1, "Kyiv", 50.5, 30.5)]
    [InlineData(2, "Nuuk", 64.2, -51.7)]
    [InlineData(2, "St. John's", 47.6, -52.7)]
    [InlineData(2, "Fernando de Noronha", -3.9, -32.4)]
    [InlineData(2, "Buenos Aires", -34.6, -58.4)]
    [InlineData(2, "Ushuaia", -54.8, -68.3)]
    [InlineData(2, "Honolulu", 21.3, -157.9)]
    [InlineData(2, "Anchorage", 61.2, -149.9)]
    [InlineData(2, "Adak", 51.9, -176.7)]
    [InlineData(2, "Attu", 52.9, 173.0)]
    [InlineData(3, "Karachi", 24.9, 67.0)]
    [InlineData(3, "Delhi", 28.6, 77.2)]
    [InlineData(3, "Beijing", 39.9, 116.4)]
    [InlineData(3, "Tokyo", 35.7, 139.8)]
    [InlineData(3, "Sydney", -33.9, 151.2)]
    [InlineData(3, "Auckland", -36.8, 174.8)]
    [InlineData(3, "Apia", -13.8, -171.8)]
    [InlineData(3, "Papeete", -17.5, -149.6)]
    [InlineData(3, "Majuro", 7.1, 171.4)]
    [InlineData(3, "Colombo", 6.9, 79.9)]
    public void Places_by_the_lines(int region, string place, double latitude, double longitude) => AssertGuess(region, place, latitude, longitude);

    // Nos. 5.3 and 5.5 name these countries; the lines alone would say otherwise of most.
    [Theory]
    [InlineData(1, "Novosibirsk", 55.0, 82.9)]
    [InlineData(1, "Irkutsk", 52.3, 104.3)]
    [InlineData(1, "Khabarovsk", 48.5, 135.1)]
    [InlineData(1, "Vladivostok", 43.1, 131.9)]
    [InlineData(1, "Petropavlovsk-Kamchatsky", 53.0, 158.7)]
    [InlineData(1, "Anadyr", 64.7, 177.5)]
    [InlineData(1, "Provideniya", 64.4, -173.2)]
    [InlineData(1, "Severnaya Zemlya", 79.5, 96.0)]
    [InlineData(1, "Yerevan", 40.2, 44.5)]
    [InlineData(1, "Baku", 40.4, 49.9)]
    [InlineData(1, "Tbilisi", 41.7, 44.8)]
    [InlineData(1, "Van", 38.5, 43.4)]
    [InlineData(1, "Almaty", 43.2, 76.9)]
    [InlineData(1, "Tashkent", 41.3, 69.3)]
    [InlineData(1, "Bishkek", 42.9, 74.6)]
    [InlineData(1, "Dushanbe", 38.6, 68.8)]
    [InlineData(1, "Ashgabat", 37.95, 58.4)]
    [InlineData(1, "Ulaanbaatar", 47.9, 106.9)]
    [InlineData(3, "Tehran", 35.7, 51.4)]
    [InlineData(3, "Tabriz", 38.1, 46.3)]
    [InlineData(3, "Ahvaz", 31.3, 48.7)]
    [InlineData(3, "Kabul", 34.5, 69.2)]
    [InlineData(3, "Urumqi", 43.8, 87.6)]
    [InlineData(3, "Harbin", 45.8, 126.6)]
    [InlineData(3, "Sapporo", 43.1, 141.4)]
    public void Places_by_their_country(int region, string place, double latitude, double longitude) => AssertGuess(region, place, latitude, longitude);

    [Fact]
    public void Every_point_has_a_Region() => Samples.Point.Sample(point => ItuRegions.Guess(point) is 1 or 2 or 3);

    // No. 5.9: along the parallel of 10 N line C divides Region 3 from Region 2.
    [Theory]
    [InlineData(10.1, -140, 2)]
    [InlineData(9.9, -140, 3)]
    [InlineData(-50, -119.9, 2)]
    [InlineData(-50, -120.1, 3)]
    [InlineData(-50, -19.9, 1)]
    [InlineData(-50, -20.1, 2)]
    [InlineData(-50, 59.9, 1)]
    [InlineData(-50, 60.1, 3)]
    public void Either_side_of_a_line(double latitude, double longitude, int region) =>
        Assert.Equal(region, ItuRegions.Guess(new(latitude, longitude)));

    private static void AssertGuess(int region, string place, double latitude, double longitude) =>
        Assert.True(region == ItuRegions.Guess(new(latitude, longitude)), $"{place} is in Region {region}.");
}
