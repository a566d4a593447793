using Bandtide.Core.Geography;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;
using Bandtide.Testing;
using CsCheck;

namespace Bandtide.Core.Tests.Sun;

/// <summary>Against astronomy-engine (checked there with PyEphem), 200 local mean days up to 70 degrees of latitude.</summary>
public sealed class SolarEventsTests
{
    private static readonly Dictionary<string, SunDayStatus> Statuses = new(StringComparer.Ordinal)
    {
        ["normal"] = SunDayStatus.Normal,
        ["partial"] = SunDayStatus.Partial,
        ["polar_day"] = SunDayStatus.PolarDay,
        ["polar_night"] = SunDayStatus.PolarNight,
    };

    [Fact]
    public void Days_agree_with_a_library()
    {
        var rows = ReferenceTable.Load("solar_events_grid.csv");
        Assert.Equal(200, rows.Count);
        Assert.All(rows, row =>
        {
            var latitude = row.Number("lat_deg");
            Assert.True(DateText.TryParse(row.Text("local_date"), out var date));
            var events = SolarEvents.Of(new(latitude, row.Number("lon_deg")), date);
            var seconds = Math.Abs(latitude) < 60 ? 60 : 180;

            Assert.Equal(Statuses[row.Text("status")], events.Sun.Status);
            AssertNear(row, "window_start_utc", events.Start, 0.1);
            AssertNear(row, "transit_utc", events.Transit, seconds);
            AssertNear(row, "sunrise_utc", events.Sun.Rising, seconds);
            AssertNear(row, "sunset_utc", events.Sun.Setting, seconds);
            AssertNear(row, "civil_dawn_utc", events.Civil.Rising, seconds);
            AssertNear(row, "civil_dusk_utc", events.Civil.Setting, seconds);
            Assert.Equal(row.Number("max_elev_deg"), events.HighestDegrees, 0.003);
            Assert.Equal(row.Number("min_elev_deg"), events.LowestDegrees, 0.003);
        });
    }

    [Fact]
    public void Sunset_of_the_worked_example_is_that_of_its_own_local_day()
    {
        var example = ReferenceTable.Load("nrel_spa_example.csv").ToDictionary(row => row.Text("quantity"), StringComparer.Ordinal);
        var events = SolarEvents.Of(new(39.742476, -105.1786), new(2003, 10, 17));

        // NREL's horizon is -0.8333 degrees, this one's -0.833: two seconds at most.
        AssertNear(example["sunrise_local"], "value", events.Sun.Rising, 5);
        AssertNear(example["sunset_local_17_october"], "value", events.Sun.Setting, 5);
        AssertNear(example["transit_local_17_october"], "value", events.Transit, 5);
    }

    [Fact]
    public void The_Sun_stands_at_the_named_elevation_when_it_passes() =>
        Gen.Select(Samples.Point, Samples.Month, Gen.Int[1, 28]).Sample((place, month, day) =>
        {
            var events = SolarEvents.Of(place, month.FirstDay.AddDays(day - 1));
            foreach (var (crossing, elevation) in Crossings(events))
            {
                foreach (var passage in new[] { crossing.Rising, crossing.Setting })
                {
                    if (passage is { } instant)
                    {
                        Assert.InRange(instant, events.Start, events.Start.AddHours(24));
                        Assert.Equal(elevation, SolarPosition.ElevationAt(place, instant), 0.001);
                    }
                }
            }
        });

    [Fact]
    public void A_status_tells_what_the_extremes_allow() =>
        Gen.Select(Samples.Point, Samples.Month, Gen.Int[1, 28]).Sample((place, month, day) =>
        {
            var events = SolarEvents.Of(place, month.FirstDay.AddDays(day - 1));
            foreach (var (crossing, elevation) in Crossings(events))
            {
                Assert.Equal(crossing.Status switch
                {
                    SunDayStatus.Normal => (true, true),
                    SunDayStatus.Partial => (crossing.Rising is not null, crossing.Rising is null),
                    _ => (false, false),
                }, (crossing.Rising is not null, crossing.Setting is not null));
                Assert.Equal(crossing.Status == SunDayStatus.PolarDay, events.LowestDegrees >= elevation);
                Assert.Equal(crossing.Status == SunDayStatus.PolarNight, events.HighestDegrees < elevation);
            }
        });

    [Theory]
    [InlineData(90)]
    [InlineData(-90)]
    public void At_a_pole_the_day_lasts_half_a_year(double latitude)
    {
        var statuses = Enumerable.Range(0, 365)
            .Select(day => SolarEvents.Of(new(latitude, 0), new DateOnly(2025, 1, 1).AddDays(day)).Sun.Status)
            .ToList();

        // 186 days from equinox to equinox in the north, 179 in the south, and refraction adds some two days at both ends.
        Assert.InRange(statuses.Count(status => status == SunDayStatus.PolarDay), latitude > 0 ? 187 : 179, latitude > 0 ? 192 : 185);
        Assert.Equal(2, statuses.Count(status => status is SunDayStatus.Partial));
    }

    private static IEnumerable<(SunCrossing Crossing, double Elevation)> Crossings(SolarEvents events) =>
        [(events.Sun, SolarEvents.HorizonDegrees), (events.Civil, -6), (events.Nautical, -12), (events.Astronomical, -18)];

    private static void AssertNear(ReferenceRow row, string column, DateTimeOffset? found, double seconds)
    {
        var expected = row.InstantOrNull(column);
        Assert.True(
            expected is null == found is null && (expected is null || Math.Abs((expected - found)!.Value.TotalSeconds) <= seconds),
            $"{row}: {column} {expected:O}, found {found:O}");
    }
}
