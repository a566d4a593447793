namespace Bandtide.Core.Heatmaps;

/// <summary>Whose seasons a region follows.</summary>
public enum SeasonAlignment
{
    /// <summary>Each station its own hemisphere's.</summary>
    Local,

    /// <summary>All as in the north.</summary>
    Calendar,
}
