namespace Bandtide.Core.Statistics;

/// <summary>Student's t distribution, with any real number of degrees of freedom.</summary>
/// <remarks>
/// Cumulative probability by the incomplete beta function (Abramowitz and Stegun 1964, 26.7.1), inverted by safeguarded Newton
/// steps; above 100,000 degrees of freedom the expansions 26.7.5 and 26.7.8 about the normal distribution.
/// </remarks>
public static class StudentT
{
    private const int Steps = 2048;

    // From here on the distance to the normal distribution is a short series, which the beta function no longer resolves.
    private const double ManyDegrees = 1e5;

    // The 97.5 % point is smooth in 1/df, so a fine table serves any number of degrees of freedom: error under 1e-5.
    private static readonly Lazy<double[]> Upper975 = new(() =>
        [.. Enumerable.Range(0, Steps + 1).Select(i => i == 0 ? Normal.Quantile(0.975) : Quantile(0.975, (double)Steps / i))]);

    /// <summary>The 97.5 % point: half a 95 % interval in standard errors.</summary>
    /// <param name="degreesOfFreedom">At least 1 (smaller is taken as 1); infinity gives 1.960.</param>
    public static double HalfWidth95(double degreesOfFreedom)
    {
        var place = Steps / Math.Max(1, degreesOfFreedom);
        var below = Math.Min((int)place, Steps - 1);
        var table = Upper975.Value;
        return table[below] + (place - below) * (table[below + 1] - table[below]);
    }

    /// <summary>The t that a share <paramref name="probability"/> of the distribution lies below.</summary>
    /// <param name="probability">Above 0 and below 1.</param>
    /// <param name="degreesOfFreedom">Above 0; infinity is the normal distribution.</param>
    /// <exception cref="ArgumentOutOfRangeException">Outside these.</exception>
    public static double Quantile(double probability, double degreesOfFreedom)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(probability);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(probability, 1);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(degreesOfFreedom);
        if (degreesOfFreedom > ManyDegrees)
        {
            return Expanded(Normal.Quantile(probability), degreesOfFreedom);
        }

        var tail = Math.Min(probability, 1 - probability);
        var t = Invert(tail, degreesOfFreedom);
        return probability < 0.5 ? -t : t;
    }

    /// <summary>Share of the distribution below t.</summary>
    /// <param name="t">Any.</param>
    /// <param name="degreesOfFreedom">Above 0; infinity is the normal distribution.</param>
    public static double Cumulative(double t, double degreesOfFreedom) =>
        degreesOfFreedom > ManyDegrees ? Normal.Cumulative(t * (1 - 1 / (4 * degreesOfFreedom)) / Math.Sqrt(1 + t * t / (2 * degreesOfFreedom)))
        : t < 0 ? Tail(-t, degreesOfFreedom)
        : 1 - Tail(t, degreesOfFreedom);

    private static double Expanded(double z, double df) =>
        z + z * (z * z + 1) / (4 * df) + z * (z * z * (5 * z * z + 16) + 3) / (96 * df * df);

    private static double Tail(double t, double df)
    {
        var square = t * t;
        return 0.5 * SpecialFunctions.IncompleteBeta(df / (df + square), square / (df + square), df / 2, 0.5);
    }

    // Newton on the logarithm of the tail over the logarithm of t, along which it is almost straight; halving where a step leaves the bracket.
    private static double Invert(double tail, double df)
    {
        if (tail == 0.5)
        {
            return 0;
        }

        var (low, high) = (0.0, 1.0);
        while (Tail(high, df) > tail)
        {
            (low, high) = (high, 2 * high);
        }

        var logScale = SpecialFunctions.LogGamma((df + 1) / 2) - SpecialFunctions.LogGamma(df / 2) - 0.5 * Math.Log(df * Math.PI);
        var t = (low + high) / 2;
        for (var i = 0; i < 200 && high - low > 1e-15 * high; i++)
        {
            var above = Tail(t, df);
            (low, high) = above > tail ? (t, high) : (low, t);
            var slope = -t * Math.Exp(logScale - (df + 1) / 2 * Math.Log(1 + t * t / df)) / above;
            var next = t * Math.Exp((Math.Log(tail) - Math.Log(above)) / slope);
            if (Math.Abs(next - t) <= 1e-15 * t)
            {
                return next;
            }

            t = next > low && next < high ? next : (low + high) / 2;
        }

        return t;
    }
}
