namespace Bandtide.Core.Heatmaps;

/// <summary>How the days and stations of a cell become one value.</summary>
public enum Statistic
{
    /// <summary>Mean over stations of each station's mean over its days.</summary>
    Mean,

    /// <summary>Median over station-days, each with weight 1/(days of its station).</summary>
    Median,

    /// <summary>Tenth percentile, weighted likewise.</summary>
    P10,

    /// <summary>Ninetieth percentile, weighted likewise.</summary>
    P90,

    /// <summary>Standard deviation: between station means for a region, between days for a station.</summary>
    Sd,
}
