namespace Bandtide.Core.Heatmaps;

/// <summary>What a heatmap shows.</summary>
public enum Measure
{
    /// <summary>Frequency band occupancy, 0 to 1.</summary>
    Occupancy,

    /// <summary>Median level of what was heard, dB in the station's unit.</summary>
    Signal,

    /// <summary>Signal minus floor, dB: free of gain, not of local noise or resolution.</summary>
    Excess,

    /// <summary>Median of all levels, dB in the station's unit.</summary>
    Level,

    /// <summary>90th percentile of all levels, dB in the station's unit.</summary>
    LevelP90,

    /// <summary>Noise floor, dB in the station's unit.</summary>
    Floor,

    /// <summary>Share of bins that look like a local carrier, 0 to 1.</summary>
    Steady,
}
