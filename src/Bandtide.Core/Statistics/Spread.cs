namespace Bandtide.Core.Statistics;

/// <summary>Running count, mean and sum of squared deviations of many series at once, one value of each series at a time.</summary>
/// <remarks>
/// Numerically stable whatever the size of the mean. Source: Welford (1962), Technometrics 4(3), 419-420.
/// </remarks>
/// <param name="size">Number of series.</param>
internal sealed class Spread(int size)
{
    private readonly int[] counts = new int[size];
    private readonly double[] means = new double[size];
    private readonly double[] squares = new double[size];

    /// <summary>Number of values of a series.</summary>
    public int Count(int series) => counts[series];

    /// <summary>Their mean, or NaN without a value.</summary>
    public double Mean(int series) => counts[series] > 0 ? means[series] : double.NaN;

    /// <summary>Their variance with divisor n - 1, or NaN under two values.</summary>
    public double Variance(int series) => counts[series] > 1 ? squares[series] / (counts[series] - 1) : double.NaN;

    /// <summary>Adds sum / divisor to each series whose divisor is large enough.</summary>
    /// <param name="sums">One for each series.</param>
    /// <param name="divisors">One for each series.</param>
    /// <param name="leastDivisor">At least 1.</param>
    public void Add(ReadOnlySpan<double> sums, ReadOnlySpan<int> divisors, int leastDivisor)
    {
        for (var i = 0; i < sums.Length; i++)
        {
            if (divisors[i] >= leastDivisor)
            {
                var value = sums[i] / divisors[i];
                var change = value - means[i];
                means[i] += change / ++counts[i];
                squares[i] += change * (value - means[i]);
            }
        }
    }
}
