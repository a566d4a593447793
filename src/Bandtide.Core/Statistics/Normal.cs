namespace Bandtide.Core.Statistics;

/// <summary>The standard normal distribution.</summary>
public static class Normal
{
    /// <summary>Share of the distribution below x.</summary>
    public static double Cumulative(double x) => x < 0 ? SpecialFunctions.NormalTail(-x) : 1 - SpecialFunctions.NormalTail(x);

    /// <summary>The x that a share <paramref name="probability"/> of the distribution lies below.</summary>
    /// <param name="probability">Above 0 and below 1.</param>
    /// <exception cref="ArgumentOutOfRangeException">Outside these.</exception>
    /// <remarks>
    /// Start: Abramowitz and Stegun (1964) 26.2.23, error under 4.5e-4; then Halley's steps on the tail, cubic in convergence.
    /// </remarks>
    public static double Quantile(double probability)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(probability);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(probability, 1);
        var tail = Math.Min(probability, 1 - probability);
        var t = Math.Sqrt(-2 * Math.Log(tail));
        var x = t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)));
        for (var i = 0; i < 3; i++)
        {
            var density = Math.Exp(-x * x / 2) / Math.Sqrt(2 * Math.PI);
            var step = (Cumulative(-x) - tail) / density;
            x += step / (1 - step * x / 2);
        }

        return probability < 0.5 ? -x : x;
    }
}
