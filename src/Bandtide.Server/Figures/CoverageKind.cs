namespace Bandtide.Server.Figures;

/// <summary>What can be said of a station's day.</summary>
internal enum CoverageKind
{
    /// <summary>Nothing was ever sent.</summary>
    NotReported,

    /// <summary>Some hours of the day.</summary>
    Partial,

    /// <summary>All 24 hours.</summary>
    Complete,

    /// <summary>Sent and withdrawn.</summary>
    Withdrawn,
}
