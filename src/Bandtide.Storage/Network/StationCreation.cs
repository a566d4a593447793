using Bandtide.Core.Stations;

namespace Bandtide.Storage.Network;

/// <summary>What registering a station gives.</summary>
public abstract record StationCreation
{
    private StationCreation()
    {
    }

    /// <summary>The station exists now.</summary>
    public sealed record Created(Station Station) : StationCreation;

    /// <summary>Another station has the code.</summary>
    public sealed record DuplicateCode : StationCreation;

    /// <summary>Regions that do not exist, or that the station's position does not belong to.</summary>
    public sealed record RefusedRegions(IReadOnlyList<string> Codes) : StationCreation;
}
