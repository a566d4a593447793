namespace Bandtide.Core.Statistics;

/// <summary>How far a mean may be from what it estimates.</summary>
/// <param name="Variance">Variance of the mean, in the squared unit of the values; NaN where the data cannot tell.</param>
/// <param name="DegreesOfFreedom">Degrees of freedom of that variance, at least 1.</param>
internal readonly record struct MeanUncertainty(double Variance, double DegreesOfFreedom)
{
    /// <summary>Nothing can be told.</summary>
    public static MeanUncertainty Unknown { get; } = new(double.NaN, 1);

    /// <summary>Half a 95 % interval of Student's t distribution, or NaN.</summary>
    public double HalfWidth95 => StudentT.HalfWidth95(DegreesOfFreedom) * Math.Sqrt(Variance);
}
