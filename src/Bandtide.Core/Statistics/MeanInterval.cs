namespace Bandtide.Core.Statistics;

/// <summary>The uncertainty of a mean over stations and days.</summary>
/// <param name="HalfWidth">Half a 95 % interval, in the unit of the values; NaN where it cannot be told.</param>
/// <param name="DegreesOfFreedom">Degrees of freedom behind it.</param>
public readonly record struct MeanInterval(double HalfWidth, double DegreesOfFreedom)
{
    /// <summary>Nothing can be told: one day of one station.</summary>
    public static MeanInterval Unknown { get; } = new(double.NaN, 0);
}
