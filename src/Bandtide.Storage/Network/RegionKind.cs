namespace Bandtide.Storage.Network;

/// <summary>What makes a station a member of a region.</summary>
public enum RegionKind
{
    /// <summary>Every station.</summary>
    Everything,

    /// <summary>The station's ITU Region.</summary>
    ItuRegion,

    /// <summary>The station's Maidenhead field.</summary>
    Field,

    /// <summary>The station's Maidenhead square.</summary>
    Square,

    /// <summary>A coordinator's list of stations.</summary>
    List,

    /// <summary>A coordinator's list of Maidenhead fields and squares.</summary>
    Locators,
}
