namespace Bandtide.Core.Statistics;

/// <summary>Variance of a weighted mean of days of which neighbours resemble each other.</summary>
/// <remarks>
/// The days are deviations from the mean of their month, so that the course of a year is no uncertainty: the mean is
/// that of such months. They follow a first-order autoregression of variance s2 and lag-1 correlation r
/// (<see cref="DayMoments"/>). The variance of the weighted mean is s2 q with q = sum over all pairs of days of w w' r^distance, gaps
/// included; s2 itself is the mean square over its expected share, 1 - q of each month.
/// Degrees of freedom: 2 over the relative variance of the estimate, which for independent errors of s2 and r is
/// 2/(n - months) + 4 f p/(p + assumed)^2, f = (1 + r)/(1 - r) being what correlation multiplies the variance by, p the pairs
/// (first-order propagation from the variance of r, (1 - r^2)/p: Bartlett 1946, Journal of the Royal Statistical Society Supplement 8, 27-41).
/// </remarks>
internal static class DaySeries
{
    /// <summary>Variance of the weighted mean and its degrees of freedom; unknown when no month has two days with a deviation.</summary>
    public static MeanUncertainty Of(DaySpans days)
    {
        var moments = new DayMoments();
        for (int start = 0, end; start < days.Days.Length; start = end)
        {
            end = days.EndOfMonth(start);
            moments.AddMonth(days[start..end]);
        }

        if (moments.Freedom < 1)
        {
            return MeanUncertainty.Unknown;
        }

        var correlation = moments.Correlation;
        var expected = 0.0;
        for (int start = 0, end; start < days.Days.Length; start = end)
        {
            end = days.EndOfMonth(start);
            var (weight, pairs) = Sums(days[start..end], correlation, deviatingOnly: true);
            expected += weight > 0 ? weight - pairs / weight : 0;
        }

        var (total, all) = Sums(days, correlation, deviatingOnly: false);
        var believed = moments.Pairs + DayMoments.AssumedPairs;
        var relative = 1.0 / moments.Freedom + 2 * (1 + correlation) / (1 - correlation) * moments.Pairs / (believed * believed);
        return new(moments.Squares / expected * all / (total * total), Math.Max(1, 1 / relative));
    }

    // Sum of the weights, and over all pairs of days of w w' r^distance. "Remembered" is the sum over the days before of w r^distance.
    private static (double Weight, double Pairs) Sums(DaySpans days, double correlation, bool deviatingOnly)
    {
        var (remembered, total, pairs, last) = (0.0, 0.0, 0.0, 0);
        for (var i = 0; i < days.Days.Length; i++)
        {
            if (deviatingOnly && days.Counts[i] == 0)
            {
                continue;
            }

            var distance = days.Days[i] - last;
            remembered *= distance == 1 ? correlation : Math.Pow(correlation, distance);
            double weight = days.Weights[i];
            pairs += weight * (2 * remembered + weight);
            remembered += weight;
            total += weight;
            last = days.Days[i];
        }

        return (total, pairs);
    }
}
