using Bandtide.Core.Geography;
using Bandtide.Core.Sun;
using Bandtide.Testing;

namespace Bandtide.Core.Tests.Sun;

/// <summary>The steps on the way to a position, each against the worked example of NREL/TP-560-34302, Table A5.1.</summary>
public sealed class ApparentSunTests
{
    // The example's instant with its own difference of the clocks, 67 s.
    private static readonly double Centuries =
        ((new DateTimeOffset(2003, 10, 17, 19, 30, 30, TimeSpan.Zero) - new DateTimeOffset(2000, 1, 1, 12, 0, 0, TimeSpan.Zero)).TotalDays + 67 / 86400.0) / 36525;

    private static readonly Dictionary<string, ReferenceRow> Example =
        ReferenceTable.Load("nrel_spa_example.csv").ToDictionary(row => row.Text("quantity"), StringComparer.Ordinal);

    [Fact]
    public void Heliocentric_position_of_the_Earth()
    {
        Assert.Equal(Value("earth_heliocentric_longitude_L"), EarthOrbit.LongitudeDegrees(Centuries / 10), 1e-7);
        Assert.Equal(Value("earth_heliocentric_latitude_B"), EarthOrbit.LatitudeDegrees(Centuries / 10), 1e-9);
        Assert.Equal(Value("earth_radius_vector_R"), EarthOrbit.Distance(Centuries / 10), 1e-9);
    }

    [Fact]
    public void Nutation_and_obliquity()
    {
        var nutation = Nutation.At(Centuries);
        Assert.Equal(Value("nutation_longitude"), nutation.LongitudeDegrees, 1e-7);
        Assert.Equal(Value("true_obliquity"), nutation.ObliquityDegrees, 1e-6);
    }

    [Fact]
    public void Right_ascension_declination_hour_angle_and_equation_of_time()
    {
        var sun = ApparentSun.At(Example["input_local_time"].Instant("value"));
        Assert.Equal(Value("right_ascension"), sun.RightAscensionDegrees, 0.0001);
        Assert.Equal(Value("declination"), sun.DeclinationDegrees, 0.0001);
        Assert.Equal(Value("hour_angle"), Angles.Wrap360(sun.GreenwichHourAngleDegrees + Value("input_longitude")), 0.0001);

        // The report's series takes the mean Sun at TT, 67 s later: 67 s x 360 degrees / year = 0.003 minutes more.
        Assert.Equal(Value("equation_of_time") - 67.0 / 86400 / 365.2422 * 1440, sun.EquationOfTimeMinutes, 0.0005);
    }

    // Meeus, Astronomical Algorithms (2nd ed.), example 25.b: 1992 October 13, 0 h TD. Quoted from memory.
    [Fact]
    public void Worked_example_of_Meeus()
    {
        var sun = ApparentSun.At(new DateTimeOffset(1992, 10, 13, 0, 0, 0, TimeSpan.Zero).AddSeconds(-59));
        Assert.Equal(15 * (13 + 13 / 60.0 + 30.749 / 3600), sun.RightAscensionDegrees, 0.0002);
        Assert.Equal(-(7 + 47 / 60.0 + 1.74 / 3600), sun.DeclinationDegrees, 0.0002);
        Assert.Equal(0.99760775, sun.DistanceAstronomicalUnits, 1e-7);
    }

    // Observed values of TT - UT as tabulated by NASA's eclipse pages (Espenak), in seconds. Quoted from memory.
    [Theory]
    [InlineData(1950, 29.1)]
    [InlineData(1960, 33.2)]
    [InlineData(1970, 40.2)]
    [InlineData(1980, 50.5)]
    [InlineData(1990, 56.9)]
    [InlineData(2000, 63.8)]
    [InlineData(2005, 64.7)]
    public void Difference_of_the_clocks_follows_the_observed_one(int year, double seconds) =>
        Assert.Equal(seconds, DeltaT.Seconds((year - 2000) * 365.25), 0.5);

    // The formulas are fits of separate periods: a jump at a seam would be a misprint.
    [Theory]
    [InlineData(1961)]
    [InlineData(1986)]
    [InlineData(2005)]
    [InlineData(2050)]
    [InlineData(2150)]
    public void Difference_of_the_clocks_has_no_step_between_periods(int year)
    {
        var days = (year - 2000) * 365.25;
        Assert.Equal(DeltaT.Seconds(days - 1), DeltaT.Seconds(days + 1), 0.5);
    }

    private static double Value(string quantity) => Example[quantity].Number("value");
}
