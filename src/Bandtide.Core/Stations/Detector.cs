namespace Bandtide.Core.Stations;

/// <summary>How a receiver forms a level from its spectra.</summary>
public enum Detector
{
    /// <summary>Mean of powers.</summary>
    Power,

    /// <summary>Mean of decibel values.</summary>
    Log,

    /// <summary>Largest value.</summary>
    Peak,
}
