namespace Bandtide.Core.Statistics;

/// <summary>Quantiles of Student's t distribution.</summary>
/// <remarks>
/// Cumulative probability by the incomplete beta function (Abramowitz &amp; Stegun 1964, 26.7.1 and 26.5.8, continued
/// fraction evaluated by Lentz's method), inverted by bisection.
/// </remarks>
public static class StudentT
{
    private const int Steps = 2048;

    // The 97.5 % point is smooth in 1/df, so a fine table serves any real number of degrees of freedom.
    private static readonly Lazy<double[]> Upper975 = new(() =>
        [.. Enumerable.Range(0, Steps + 1).Select(i => Quantile(0.975, i == 0 ? 1e9 : (double)Steps / i))]);

    /// <summary>The 97.5 % point: half a 95 % interval in standard errors.</summary>
    /// <param name="degreesOfFreedom">At least 1 (smaller is taken as 1); infinity gives 1.960.</param>
    public static double HalfWidth95(double degreesOfFreedom)
    {
        var place = Steps / Math.Max(1, degreesOfFreedom);
        var below = Math.Min((int)place, Steps - 1);
        var table = Upper975.Value;
        return table[below] + ((place - below) * (table[below + 1] - table[below]));
    }

    /// <summary>The t that a share <paramref name="probability"/> of the distribution lies below.</summary>
    /// <param name="probability">Above 0.5, below 1.</param>
    /// <param name="degreesOfFreedom">Above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">Outside these.</exception>
    public static double Quantile(double probability, double degreesOfFreedom)
    {
        ArgumentOutOfRangeException.ThrowIfLessThanOrEqual(probability, 0.5);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(probability, 1);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(degreesOfFreedom);
        var (low, high) = (0.0, 1.0);
        while (Cumulative(high, degreesOfFreedom) < probability)
        {
            high *= 2;
        }

        for (var i = 0; i < 100 && high - low > 1e-13 * high; i++)
        {
            var middle = (low + high) / 2;
            (low, high) = Cumulative(middle, degreesOfFreedom) < probability ? (middle, high) : (low, middle);
        }

        return (low + high) / 2;
    }

    /// <summary>Share of the distribution below t, for t of 0 or more.</summary>
    public static double Cumulative(double t, double degreesOfFreedom) =>
        1 - (0.5 * IncompleteBeta(degreesOfFreedom / (degreesOfFreedom + (t * t)), t * t / (degreesOfFreedom + (t * t)), degreesOfFreedom / 2, 0.5));

    // I_x(a, b), with y = 1 - x given apart because it may be tiny.
    private static double IncompleteBeta(double x, double y, double a, double b)
    {
        if (x <= 0 || y <= 0)
        {
            return x <= 0 ? 0 : 1;
        }

        var front = Math.Exp(LogGamma(a + b) - LogGamma(a) - LogGamma(b) + (a * Math.Log(x)) + (b * Math.Log(y)));
        return x < (a + 1) / (a + b + 2)
            ? front * Fraction(x, a, b) / a
            : 1 - (front * Fraction(y, b, a) / b);
    }

    private static double Fraction(double x, double a, double b)
    {
        const double tiny = 1e-300;
        var (c, d) = (1.0, 1 / NotZero(1 - ((a + b) * x / (a + 1))));
        var result = d;
        for (var m = 1; m <= 10_000; m++)
        {
            var even = m * (b - m) * x / ((a + (2 * m) - 1) * (a + (2 * m)));
            d = 1 / NotZero(1 + (even * d));
            c = NotZero(1 + (even / c));
            result *= d * c;
            var odd = -(a + m) * (a + b + m) * x / ((a + (2 * m)) * (a + (2 * m) + 1));
            d = 1 / NotZero(1 + (odd * d));
            c = NotZero(1 + (odd / c));
            var step = d * c;
            result *= step;
            if (Math.Abs(step - 1) < 1e-15)
            {
                break;
            }
        }

        return result;

        static double NotZero(double value) => Math.Abs(value) < tiny ? tiny : value;
    }

    // Stirling's series after shifting the argument above 10 (Abramowitz & Stegun 6.1.41); error under 1e-13.
    private static double LogGamma(double x)
    {
        var shift = 0.0;
        while (x < 10)
        {
            shift += Math.Log(x++);
        }

        var s = 1 / (x * x);
        return ((x - 0.5) * Math.Log(x)) - x + (0.5 * Math.Log(2 * Math.PI))
            + ((1.0 / 12 - (s * (1.0 / 360 - (s * (1.0 / 1260 - (s * (1.0 / 1680 - (s / 1188)))))))) / x) - shift;
    }
}
