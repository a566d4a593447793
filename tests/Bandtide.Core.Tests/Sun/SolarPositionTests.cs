using Bandtide.Core.Geography;
using Bandtide.Core.Sun;
using Bandtide.Testing;
using CsCheck;

namespace Bandtide.Core.Tests.Sun;

/// <summary>Against astronomy-engine, PyEphem and NREL/TP-560-34302, Table A5.1; sources in the README of the reference files.</summary>
public sealed class SolarPositionTests
{
    private const double ToleranceDegrees = 0.003;

    [Fact]
    public void Elevation_and_azimuth_agree_with_two_libraries_from_2015_to_2035()
    {
        var rows = ReferenceTable.Load("solar_position_grid.csv");
        Assert.Equal(200, rows.Count);
        Assert.All(rows, row =>
        {
            var sun = SolarPosition.At(new(row.Number("lat_deg"), row.Number("lon_deg")), row.Instant("utc"));
            AssertDirection(row, "elev_astronomy_engine_deg", "az_astronomy_engine_deg", sun);
            AssertDirection(row, "elev_pyephem_deg", "az_pyephem_deg", sun);
        });
    }

    [Fact]
    public void Elevation_and_azimuth_agree_with_a_library_in_every_year_from_1950_to_2050()
    {
        var rows = ReferenceTable.Load("solar_position_century.csv");
        Assert.Equal(101, rows.Select(row => row.Instant("utc").Year).Distinct().Count());
        Assert.All(rows, row =>
        {
            var sun = SolarPosition.At(new(row.Number("lat_deg"), row.Number("lon_deg")), row.Instant("utc"));
            AssertDirection(row, "elevation_deg", "azimuth_deg", sun);
        });
    }

    [Fact]
    public void Worked_example_of_the_solar_position_algorithm()
    {
        var example = ReferenceTable.Load("nrel_spa_example.csv").ToDictionary(row => row.Text("quantity"), StringComparer.Ordinal);
        var sun = SolarPosition.At(
            new(Value("input_latitude"), Value("input_longitude")), example["input_local_time"].Instant("value"));

        Assert.Equal(Value("topocentric_elevation_no_refraction"), sun.ElevationDegrees, 0.0003);
        Assert.Equal(Value("azimuth_from_north_eastward"), sun.AzimuthDegrees, 0.0003);

        double Value(string quantity) => example[quantity].Number("value");
    }

    [Fact]
    public void Subsolar_point_at_the_peaks_of_large_flares()
    {
        Assert.All(ReferenceTable.Load("major_flares.csv"), row =>
        {
            var point = SolarPosition.Subsolar(row.Instant("peak_utc"));
            Assert.Equal(row.Number("subsolar_lat_deg"), point.LatitudeDegrees, 0.05);
            Assert.Equal(0, Angles.Wrap180(row.Number("subsolar_lon_deg") - point.LongitudeDegrees), 0.05);
        });
    }

    [Fact]
    public void Elevation_is_ninety_degrees_less_the_distance_to_the_subsolar_point() =>
        Gen.Select(Samples.Instant, Samples.Point).Sample((instant, place) =>
        {
            // Parallax, 0.0025 degrees at most, is what this plain geometry leaves out.
            var distance = GreatCircle.DistanceKilometres(place, SolarPosition.Subsolar(instant));
            var degrees = double.RadiansToDegrees(distance / GreatCircle.EarthRadiusKilometres);
            return Math.Abs(90 - degrees - SolarPosition.ElevationAt(place, instant)) < 0.0026;
        });

    [Fact]
    public void Azimuth_is_the_bearing_of_the_subsolar_point() =>
        Gen.Select(Samples.Instant, Samples.Point).Sample((instant, place) =>
        {
            var sun = SolarPosition.At(place, instant);
            var bearing = GreatCircle.InitialBearingDegrees(place, SolarPosition.Subsolar(instant));
            var scale = Math.Cos(double.DegreesToRadians(sun.ElevationDegrees));
            return Math.Abs(Angles.Wrap180(bearing - sun.AzimuthDegrees)) * scale < 0.0026;
        });

    private static void AssertDirection(ReferenceRow row, string elevationColumn, string azimuthColumn, SolarPosition sun)
    {
        var elevation = row.Number(elevationColumn);
        var sideways = Angles.Wrap180(row.Number(azimuthColumn) - sun.AzimuthDegrees) * Math.Cos(double.DegreesToRadians(elevation));
        Assert.True(
            Math.Abs(elevation - sun.ElevationDegrees) <= ToleranceDegrees && Math.Abs(sideways) <= ToleranceDegrees,
            $"{row}: {elevationColumn} {elevation}, found {sun}");
    }
}
