namespace Bandtide.Core.Heatmaps;

/// <summary>Whether a 95 % interval of the mean is wanted.</summary>
public enum IntervalChoice
{
    /// <summary>Where the statistic is a mean.</summary>
    Auto,

    /// <summary>Never; the answer comes from month tiles alone.</summary>
    None,
}
