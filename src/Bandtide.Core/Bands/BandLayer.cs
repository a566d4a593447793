namespace Bandtide.Core.Bands;

/// <summary>The two ways the spectrum below 30 MHz is divided; within a layer no two bands overlap.</summary>
public enum BandLayer
{
    /// <summary>Bands by what is transmitted there, after Article 5 of the ITU Radio Regulations.</summary>
    Service,

    /// <summary>Slices of 1 MHz.</summary>
    Slice,
}
