using Bandtide.Core.Geography;

namespace Bandtide.Core.Sun;

/// <summary>Transit, rise, set and twilights of one local mean day at one place.</summary>
/// <remarks>
/// The day is the 24 hours from local mean midnight, date minus longitude / 15 hours, not a day of UTC: only so does every
/// ordinary day hold one rise and one set. An event is the first passage within them. Elevations are geometric: -0.833 degrees
/// for the Sun's upper limb at a sea horizon (34' of refraction, 16' of radius; Meeus, Astronomical Algorithms, chapter 15),
/// -6, -12 and -18 for the twilights. Within a minute up to 60 degrees of latitude and three up to 70; refraction near the
/// horizon and the height of real horizons matter more.
/// </remarks>
/// <param name="Date">The local mean date.</param>
/// <param name="Start">Its first instant.</param>
/// <param name="Transit">Passage of the meridian, near local noon.</param>
/// <param name="Sun">Sunrise and sunset.</param>
/// <param name="Civil">Dawn and dusk at -6 degrees.</param>
/// <param name="Nautical">Dawn and dusk at -12 degrees.</param>
/// <param name="Astronomical">Dawn and dusk at -18 degrees.</param>
/// <param name="HighestDegrees">Greatest elevation of the Sun's centre.</param>
/// <param name="LowestDegrees">Least elevation of the Sun's centre.</param>
public sealed record SolarEvents(
    DateOnly Date,
    DateTimeOffset Start,
    DateTimeOffset Transit,
    SunCrossing Sun,
    SunCrossing Civil,
    SunCrossing Nautical,
    SunCrossing Astronomical,
    double HighestDegrees,
    double LowestDegrees)
{
    /// <summary>Geometric elevation of the Sun's centre at sunrise and sunset, degrees.</summary>
    public const double HorizonDegrees = -0.833;

    /// <summary>The events of a local mean date at a place.</summary>
    public static SolarEvents Of(GeoPoint place, DateOnly date)
    {
        var start = new DateTimeOffset(date, TimeOnly.MinValue, TimeSpan.Zero).AddHours(-place.LongitudeDegrees / 15);
        var path = new SunPath(place, start);
        return new(
            date,
            start,
            start.AddHours(path.TransitHour()),
            Crossing(HorizonDegrees),
            Crossing(-6),
            Crossing(-12),
            Crossing(-18),
            path.Highest.Elevation,
            path.Lowest.Elevation);

        SunCrossing Crossing(double elevation)
        {
            var (rising, setting) = (Instant(path.Passage(elevation, +1)), Instant(path.Passage(elevation, -1)));
            var status = (rising, setting) switch
            {
                (not null, not null) => SunDayStatus.Normal,
                (null, null) => path.Highest.Elevation >= elevation ? SunDayStatus.PolarDay : SunDayStatus.PolarNight,
                _ => SunDayStatus.Partial,
            };
            return new(status, rising, setting);
        }

        DateTimeOffset? Instant(double? hours) => hours is { } passed ? start.AddHours(passed) : null;
    }
}
