namespace Bandtide.Core.Statistics;

/// <summary>Quantiles of weighted values.</summary>
public static class WeightedQuantiles
{
    /// <summary>The quantile that is linear between the midpoints of cumulative weight.</summary>
    /// <param name="probability">0 to 1.</param>
    /// <param name="values">At least one, in ascending order; equal ones in ascending order of weight, so that the result does not depend on chance.</param>
    /// <param name="weights">As many, positive, any scale.</param>
    /// <returns>A value between the least and the largest; beyond the outermost midpoints the outermost values.</returns>
    /// <remarks>
    /// Value i stands at (C(i) - w(i)/2) / C(n), C being the cumulative weight. With equal weights that is (i - 0.5)/n: definition
    /// 5 of Hyndman &amp; Fan (1996), The American Statistician 50(4), 361-365.
    /// </remarks>
    /// <exception cref="ArgumentException">No value, or another number of weights.</exception>
    public static double Of(double probability, ReadOnlySpan<double> values, ReadOnlySpan<double> weights)
    {
        if (values.IsEmpty || values.Length != weights.Length)
        {
            throw new ArgumentException("Needs at least one value and as many weights.", nameof(values));
        }

        var total = 0.0;
        foreach (var weight in weights)
        {
            total += weight;
        }

        var (target, before, place, previous) = (probability * total, 0.0, 0.0, double.NaN);
        for (var i = 0; i < values.Length; i++)
        {
            var here = before + (weights[i] / 2);
            if (target <= here)
            {
                return i == 0 ? values[0] : previous + ((values[i] - previous) * (target - place) / (here - place));
            }

            before += weights[i];
            (place, previous) = (here, values[i]);
        }

        return values[^1];
    }
}
