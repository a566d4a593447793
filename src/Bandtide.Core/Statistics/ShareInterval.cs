namespace Bandtide.Core.Statistics;

/// <summary>A 95 % interval of a share that stays within 0 and 1.</summary>
/// <remarks>
/// The half-width is carried to the logit by the delta method at (k + 0.5)/(n + 1), k being the mean times n independent looks
/// (the empirical logit: Haldane 1955, Annals of Human Genetics 20, 309-311; Cox and Snell 1989, Analysis of Binary Data, 2.1.6), and is not
/// taken below that of n looks, so that a mean of 0 or 1 has an interval of its own. The mean always lies within.
/// </remarks>
internal static class ShareInterval
{
    /// <summary>The interval.</summary>
    /// <param name="mean">0 to 1.</param>
    /// <param name="halfWidth">Half a 95 % interval on the scale of the share, 0 or more.</param>
    /// <param name="looks">Number of independent looks that the mean rests on, above 0.</param>
    public static (double Lower, double Upper) Around(double mean, double halfWidth, double looks)
    {
        var centre = (mean * looks + 0.5) / (looks + 1);
        var slope = centre * (1 - centre);
        var width = Math.Max(halfWidth, StudentT.HalfWidth95(double.PositiveInfinity) * Math.Sqrt(slope / (looks + 1))) / slope;
        var logit = Math.Log(centre / (1 - centre));
        return (Math.Min(mean, Expit(logit - width)), Math.Max(mean, Expit(logit + width)));
    }

    private static double Expit(double x) => 1 / (1 + Math.Exp(-x));
}
