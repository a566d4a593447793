namespace Bandtide.Core.Sheets;

/// <summary>What a cell of a day sheet holds, each as a whole number of its stored resolution.</summary>
public enum Quantity
{
    /// <summary>Number of sweeps, 1 to 1,000,000. Present in every cell.</summary>
    Sweeps,

    /// <summary>Frequency band occupancy (ITU-R SM.1880), in 1e-4, 0 to 10,000. Present in every cell.</summary>
    Occupancy,

    /// <summary>Median level of the occupied (bin, sweep) pairs, in 0.01 dB of the station's unit.</summary>
    Signal,

    /// <summary>Median of all levels, in 0.01 dB of the station's unit.</summary>
    Level,

    /// <summary>90th percentile of all levels, in 0.01 dB of the station's unit.</summary>
    LevelP90,

    /// <summary>Estimated noise floor, in 0.01 dB of the station's unit.</summary>
    Floor,

    /// <summary>Share of bins that look like a local carrier, in 1e-4, 0 to 10,000.</summary>
    Steady,

    /// <summary>Share of the band's width that was observed, in 1e-4, 0 to 10,000; absent means all.</summary>
    Coverage,
}
