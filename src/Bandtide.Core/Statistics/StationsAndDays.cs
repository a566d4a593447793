namespace Bandtide.Core.Statistics;

/// <summary>Uncertainty of a mean over stations that share days.</summary>
/// <remarks>
/// Two-way variance components: value = mean + station + day + rest. The variance between the voters' means over their
/// number holds the station part and the rest's; the series of day means, each station's own mean taken off, holds the day part
/// and again the rest's, which is therefore subtracted once (analysis of variance: Searle, Casella and McCulloch 1992, Variance
/// Components, chapter 4; the same sum as the two-way clustered variance of Cameron, Gelbach and Miller 2011, Journal of Business and
/// Economic Statistics 29, 238-249). Degrees of freedom of the sum: Satterthwaite 1946, Biometrics Bulletin 2, 110-114.
/// </remarks>
internal static class StationsAndDays
{
    /// <summary>Adds the parts.</summary>
    /// <param name="voterVariance">Variance between the voters' means, divisor n - 1; NaN under two.</param>
    /// <param name="voters">Number of voters.</param>
    /// <param name="days">Uncertainty from the series of days, <see cref="DaySeries"/>.</param>
    /// <param name="rest">Variance of the rest as contained in <paramref name="days"/>.</param>
    /// <returns>The day part alone for one voter; unknown where that is.</returns>
    public static MeanUncertainty Combine(double voterVariance, int voters, MeanUncertainty days, double rest)
    {
        if (voters < 2 || double.IsNaN(days.Variance))
        {
            return days;
        }

        var stationPart = voterVariance / voters;
        var total = stationPart + Math.Max(0, days.Variance - rest);
        var relative = (stationPart * stationPart / (voters - 1) + days.Variance * days.Variance / days.DegreesOfFreedom) / (total * total);
        return new(total, total > 0 ? Math.Max(1, 1 / relative) : double.PositiveInfinity);
    }
}
