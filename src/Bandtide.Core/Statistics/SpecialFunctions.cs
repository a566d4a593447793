namespace Bandtide.Core.Statistics;

/// <summary>The special functions behind the distributions.</summary>
/// <remarks>
/// Sources: M. Abramowitz and I. A. Stegun (1964), Handbook of Mathematical Functions, formulas as cited; continued fractions by
/// the modified Lentz method (I. J. Thompson and A. R. Barnett 1986, Journal of Computational Physics 64, 490-509).
/// </remarks>
internal static class SpecialFunctions
{
    private const double Tiny = 1e-300;
    private const double Precision = 1e-16;
    private const int MostTerms = 10_000;

    /// <summary>Natural logarithm of the gamma function, for x above 0.</summary>
    /// <remarks>Stirling's series (6.1.41) after shifting the argument above 10; error under 1e-13.</remarks>
    public static double LogGamma(double x)
    {
        var shift = 0.0;
        while (x < 10)
        {
            shift += Math.Log(x++);
        }

        var s = 1 / (x * x);
        return (x - 0.5) * Math.Log(x) - x + 0.5 * Math.Log(2 * Math.PI)
            + (1.0 / 12 - s * (1.0 / 360 - s * (1.0 / 1260 - s * (1.0 / 1680 - s / 1188)))) / x - shift;
    }

    /// <summary>The regularised incomplete beta function I_x(a, b) (26.5.8).</summary>
    /// <param name="x">0 to 1.</param>
    /// <param name="complement">1 - x, given apart because it may be tiny.</param>
    /// <param name="a">Above 0.</param>
    /// <param name="b">Above 0.</param>
    public static double IncompleteBeta(double x, double complement, double a, double b)
    {
        if (x <= 0 || complement <= 0)
        {
            return x <= 0 ? 0 : 1;
        }

        var front = Math.Exp(LogGamma(a + b) - LogGamma(a) - LogGamma(b) + a * Math.Log(x) + b * Math.Log(complement));
        return x < (a + 1) / (a + b + 2)
            ? front * BetaFraction(x, a, b) / a
            : 1 - front * BetaFraction(complement, b, a) / b;
    }

    /// <summary>Share of the standard normal distribution above x, for x of 0 or more.</summary>
    /// <remarks>Series 26.2.10 below 3, continued fraction 26.2.14 from there on.</remarks>
    public static double NormalTail(double x)
    {
        var density = Math.Exp(-x * x / 2) / Math.Sqrt(2 * Math.PI);
        return x < 3 ? 0.5 - density * TailSeries(x) : density / TailFraction(x);
    }

    // sum x^(2n+1) / (1 3 5 ... (2n+1))
    private static double TailSeries(double x)
    {
        var (sum, term) = (0.0, x);
        for (var n = 1; term > Precision * sum; n++)
        {
            sum += term;
            term *= x * x / (2 * n + 1);
        }

        return sum;
    }

    // x + 1/(x + 2/(x + 3/(x + ...))), from behind: 200 levels are ample from x = 3 on.
    private static double TailFraction(double x)
    {
        var value = x;
        for (var n = 200; n > 0; n--)
        {
            value = x + n / value;
        }

        return value;
    }

    private static double BetaFraction(double x, double a, double b)
    {
        var (c, d) = (1.0, 1 / NotZero(1 - (a + b) * x / (a + 1)));
        var result = d;
        for (var m = 1; m <= MostTerms; m++)
        {
            var even = m * (b - m) * x / ((a + 2 * m - 1) * (a + 2 * m));
            d = 1 / NotZero(1 + even * d);
            c = NotZero(1 + even / c);
            result *= d * c;
            var odd = -(a + m) * (a + b + m) * x / ((a + 2 * m) * (a + 2 * m + 1));
            d = 1 / NotZero(1 + odd * d);
            c = NotZero(1 + odd / c);
            result *= d * c;
            if (Math.Abs(d * c - 1) < Precision)
            {
                break;
            }
        }

        return result;
    }

    private static double NotZero(double value) => Math.Abs(value) < Tiny ? Tiny : value;
}
