namespace Bandtide.Core.Statistics;

/// <summary>Variance of the mean of a short series of days whose neighbours resemble each other.</summary>
public static class DaySeries
{
    private const double LargestCorrelation = 0.9;

    /// <summary>Variance of the mean and its degrees of freedom.</summary>
    /// <param name="values">One per day in order of time, NaN where there is none; deviations from their mean or not.</param>
    /// <param name="noiseVariance">Part of the values' variance that is independent from day to day and does not belong to the mean's variance; 0 for none.</param>
    /// <returns>Variance 0 with under two days.</returns>
    /// <remarks>
    /// First-order autoregression. The lag-1 correlation is estimated over neighbouring dates and corrected for the bias that
    /// subtracting the mean causes, -(1 + 3r)/n (Kendall 1954, Biometrika 41, 403-404; Marriott &amp; Pope, same issue). The mean of n days
    /// has variance s2 f/n with f = 1 + 2 sum (1 - k/n) r^k, exact for a first-order autoregression; s2 is itself corrected for f
    /// (its expectation is sigma2 (n - f)/(n - 1)). Degrees of freedom: n/f - 1, of as many independent days. Negative
    /// correlation counts as none.
    /// </remarks>
    public static (double Variance, double DegreesOfFreedom) VarianceOfMean(ReadOnlySpan<double> values, double noiseVariance = 0)
    {
        var (count, sum) = (0, 0.0);
        foreach (var value in values)
        {
            if (!double.IsNaN(value))
            {
                count++;
                sum += value;
            }
        }

        if (count < 2)
        {
            return (0, 0);
        }

        var mean = sum / count;
        var (squares, products, pairs, before) = (0.0, 0.0, 0, double.NaN);
        foreach (var value in values)
        {
            var deviation = value - mean;
            if (!double.IsNaN(deviation))
            {
                squares += deviation * deviation;
                if (!double.IsNaN(before))
                {
                    products += deviation * before;
                    pairs++;
                }
            }

            before = deviation;
        }

        var signal = (squares / (count - 1)) - noiseVariance;
        if (signal <= 0)
        {
            return (0, count - 1);
        }

        var raw = pairs == 0 ? 0 : products / pairs / (squares / count - noiseVariance is var variance && variance > 0 ? variance : signal);
        var correlation = count <= 3 ? 0 : Math.Clamp(((count * raw) + 1) / (count - 3), 0, LargestCorrelation);
        var inflation = Inflation(correlation, count);
        inflation = Math.Min(inflation, count / 2.0);
        return (signal * (count - 1) / (count - inflation) * inflation / count, Math.Max(1, (count / inflation) - 1));
    }

    /// <summary>How much larger the variance of a mean of n days is than of independent days.</summary>
    public static double Inflation(double correlation, int count)
    {
        var (factor, power) = (1.0, 1.0);
        for (var k = 1; k < count && power > 1e-6; k++)
        {
            power *= correlation;
            factor += 2 * (1 - ((double)k / count)) * power;
        }

        return factor;
    }
}
