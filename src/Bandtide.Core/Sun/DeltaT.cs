namespace Bandtide.Core.Sun;

/// <summary>Difference between the uniform time of ephemerides (TT) and universal time, which follows the Earth's turning.</summary>
/// <remarks>
/// Polynomials of Espenak and Meeus, Five Millennium Canon of Solar Eclipses (NASA/TP-2006-214141), section 2.7. Between
/// 1950 and 2050 the error stays below 20 s, in which the Sun moves 0.0002 degrees along the ecliptic; outside 1941-2150 the
/// long-term parabola stands in. UTC is taken for UT1: they differ by less than 0.9 s, or 0.004 degrees of hour angle.
/// </remarks>
internal static class DeltaT
{
    /// <summary>TT minus UT in seconds.</summary>
    /// <param name="daysSinceJ2000">Days since 2000-01-01 12:00 UT.</param>
    public static double Seconds(double daysSinceJ2000)
    {
        var year = 2000 + daysSinceJ2000 / 365.25;
        return year switch
        {
            >= 1941 and < 1961 => Polynomial(year - 1950, [29.07, 0.407, -1 / 233.0, 1 / 2547.0]),
            >= 1961 and < 1986 => Polynomial(year - 1975, [45.45, 1.067, -1 / 260.0, -1 / 718.0]),
            >= 1986 and < 2005 => Polynomial(year - 2000, [63.86, 0.3345, -0.060374, 0.0017275, 0.000651814, 0.00002373599]),
            >= 2005 and < 2050 => Polynomial(year - 2000, [62.92, 0.32217, 0.005589]),
            >= 2050 and < 2150 => Parabola(year) - 0.5628 * (2150 - year),
            _ => Parabola(year),
        };
    }

    /// <summary>Sum of coefficient x power, lowest power first.</summary>
    internal static double Polynomial(double x, ReadOnlySpan<double> coefficients)
    {
        var sum = 0.0;
        for (var i = coefficients.Length - 1; i >= 0; i--)
        {
            sum = sum * x + coefficients[i];
        }

        return sum;
    }

    private static double Parabola(double year) => Polynomial((year - 1820) / 100, [-20, 0, 32]);
}
