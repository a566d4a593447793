namespace Bandtide.Core.Sheets;

/// <summary>The fields of a cell as they travel.</summary>
public enum SheetField
{
    /// <summary>UTC hour, 0 to 23.</summary>
    Hour,

    /// <summary>Band code.</summary>
    Band,

    /// <summary>Number of sweeps.</summary>
    Sweeps,

    /// <summary>Occupancy, 0 to 1.</summary>
    Occupancy,

    /// <summary>Signal, dB.</summary>
    Signal,

    /// <summary>Median level, dB.</summary>
    Level,

    /// <summary>90th percentile of the level, dB.</summary>
    LevelP90,

    /// <summary>Floor, dB.</summary>
    Floor,

    /// <summary>Steady share, 0 to 1.</summary>
    Steady,

    /// <summary>Observed share of the band, 0 to 1.</summary>
    Coverage,
}
