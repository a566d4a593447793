namespace Bandtide.Core.Time;

/// <summary>Half of the Earth whose seasons a place follows; the equator counts as north.</summary>
public enum Hemisphere
{
    /// <summary>Latitude 0 and above.</summary>
    North,

    /// <summary>Latitude below 0.</summary>
    South,
}
