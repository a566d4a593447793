namespace Bandtide.Testing.Simulation;

/// <summary>How a simulated station-day becomes a value.</summary>
public enum CoverageScale
{
    /// <summary>Occupancy, the effects being added to it.</summary>
    Occupancy,

    /// <summary>Occupancy, the effects being added to its logit.</summary>
    LogitOccupancy,

    /// <summary>Occupancy, each day from the Beta distribution with parameters 0.5 and 20, independent.</summary>
    BetaOccupancy,

    /// <summary>Occupancy, the effects being added to its logit, of which an hour of thirty independent looks is seen.</summary>
    LookedAtOccupancy,

    /// <summary>Level in dB, the effects (times 100) being added to it.</summary>
    Level,
}
