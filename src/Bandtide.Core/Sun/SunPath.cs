using Bandtide.Core.Geography;

namespace Bandtide.Core.Sun;

/// <summary>The Sun's way across one place's sky for 24 hours, cheap to evaluate at many instants.</summary>
/// <remarks>
/// Declination, equation of time and distance change so evenly that a parabola through three exact positions follows them
/// within 0.00001 degrees over a day; the turn of the Earth is added exactly.
/// </remarks>
internal sealed class SunPath
{
    private const double LengthHours = 24;
    private const double SampleHours = 1.0 / 6;
    private const double ToleranceHours = 1e-6;

    private readonly GeoPoint place;
    private readonly double startUtcHours;
    private readonly ApparentSun[] nodes;
    private readonly List<(double Hour, double Elevation)> samples = [];

    public SunPath(GeoPoint place, DateTimeOffset start)
    {
        this.place = place;
        startUtcHours = start.UtcDateTime.TimeOfDay.TotalHours;
        nodes = [ApparentSun.At(start), ApparentSun.At(start.AddHours(LengthHours / 2)), ApparentSun.At(start.AddHours(LengthHours))];
        for (var i = 0; i <= LengthHours / SampleHours; i++)
        {
            samples.Add((i * SampleHours, Elevation(i * SampleHours)));
        }

        // Between samples the Sun can graze an elevation; with the turning points among them every passage shows.
        Highest = Extreme(+1);
        Lowest = Extreme(-1);
        samples.Add(Highest);
        samples.Add(Lowest);
        samples.Sort();
    }

    /// <summary>Greatest elevation in degrees and when, in hours from the start.</summary>
    public (double Hour, double Elevation) Highest { get; }

    /// <summary>Least elevation in degrees and when, in hours from the start.</summary>
    public (double Hour, double Elevation) Lowest { get; }

    /// <summary>Passage of the local meridian, in hours from the start, for a path that starts near local mean midnight.</summary>
    public double TransitHour()
    {
        var hour = LengthHours / 2;
        for (var i = 0; i < 4; i++)
        {
            hour -= Angles.Wrap180(GreenwichHourAngle(hour) + place.LongitudeDegrees) / 15;
        }

        return hour;
    }

    /// <summary>First passage of an elevation upward (direction 1) or downward (-1), in hours from the start.</summary>
    public double? Passage(double elevationDegrees, int direction)
    {
        for (var i = 1; i < samples.Count; i++)
        {
            if (direction * (samples[i - 1].Elevation - elevationDegrees) < 0 && direction * (samples[i].Elevation - elevationDegrees) >= 0)
            {
                return Bisect(samples[i - 1].Hour, samples[i].Hour, hour => direction * (Elevation(hour) - elevationDegrees) < 0);
            }
        }

        return null;
    }

    private double Elevation(double hour) =>
        SolarPosition.Of(place, Parabola(hour, sun => sun.DeclinationDegrees), GreenwichHourAngle(hour), nodes[1].DistanceAstronomicalUnits).ElevationDegrees;

    private double GreenwichHourAngle(double hour) =>
        15 * (startUtcHours + hour - 12) + Parabola(hour, sun => sun.EquationOfTimeMinutes) / 4;

    private double Parabola(double hour, Func<ApparentSun, double> part)
    {
        var x = hour / (LengthHours / 2) - 1;
        var (first, middle, last) = (part(nodes[0]), part(nodes[1]), part(nodes[2]));
        return middle + x * (last - first) / 2 + x * x * (first - 2 * middle + last) / 2;
    }

    private (double Hour, double Elevation) Extreme(int direction)
    {
        var best = samples.MaxBy(sample => direction * sample.Elevation).Hour;
        var (low, high) = (Math.Max(0, best - SampleHours), Math.Min(LengthHours, best + SampleHours));
        while (high - low > ToleranceHours)
        {
            var (left, right) = (low + (high - low) / 3, high - (high - low) / 3);
            var leftIsBetter = direction * Elevation(left) > direction * Elevation(right);
            (low, high) = leftIsBetter ? (low, right) : (left, high);
        }

        return (low, Elevation(low));
    }

    private static double Bisect(double low, double high, Func<double, bool> isBefore)
    {
        while (high - low > ToleranceHours)
        {
            var middle = (low + high) / 2;
            (low, high) = isBefore(middle) ? (middle, high) : (low, middle);
        }

        return (low + high) / 2;
    }
}
