using System.Collections.Concurrent;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sun;

/// <summary>Hours of a station's day by the Sun: one whole-hour shift per station and month.</summary>
/// <remarks>
/// An hourly cell cannot be divided, so it goes whole to the solar hour that holds its midpoint, with the mean equation of
/// time of the month; the UTC date is kept. A cell's midpoint is thereby at most half an hour off, plus the equation's walk
/// within the month (at most some 8 minutes, at the ends of December).
/// </remarks>
public static class SolarClock
{
    private static readonly ConcurrentDictionary<int, double> MeanMinutes = new();

    /// <summary>Mean of the equation of time over the days of a month at 12:00 UTC, in minutes. Remembered once computed.</summary>
    public static double MeanEquationOfTimeMinutes(YearMonth month) => MeanMinutes.GetOrAdd(month.Number, static number =>
    {
        var noon = new DateTimeOffset(YearMonth.FromNumber(number).FirstDay, new(12, 0), TimeSpan.Zero);
        var days = YearMonth.FromNumber(number).Days;
        return Enumerable.Range(0, days).Average(day => EquationOfTime.Minutes(noon.AddDays(day)));
    });

    /// <summary>The k for which UTC hour h goes to solar hour (h + k) mod 24.</summary>
    /// <param name="longitudeDegrees">East positive, -180 to 180.</param>
    /// <param name="month">Month of the cells.</param>
    /// <returns>0 to 23.</returns>
    public static int Shift(double longitudeDegrees, YearMonth month)
    {
        // The midpoint h + 0.5 lies in solar hour floor(h + 0.5 + ahead): the same whole hours on for every h.
        var ahead = longitudeDegrees / 15 + MeanEquationOfTimeMinutes(month) / 60;
        return (int)((Math.Floor(ahead + 0.5) + 24) % 24);
    }
}
