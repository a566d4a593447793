namespace Bandtide.Core.Sun;

/// <summary>What the Sun does at an elevation during the 24 hours of a local mean day.</summary>
public enum SunDayStatus
{
    /// <summary>It passes the elevation upward and downward.</summary>
    Normal,

    /// <summary>It stays above: for the horizon, midnight sun.</summary>
    PolarDay,

    /// <summary>It stays below: for the horizon, polar night.</summary>
    PolarNight,

    /// <summary>It passes once only, as around the first and last days of midnight sun and polar night.</summary>
    Partial,
}
