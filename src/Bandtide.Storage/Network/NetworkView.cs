using Bandtide.Core.Bands;
using Bandtide.Core.Stations;

namespace Bandtide.Storage.Network;

/// <summary>All small tables at one moment: bands, stations with their setups, and regions. Immutable.</summary>
/// <remarks>Held in memory and replaced whole when the network's change counter moves; no query joins to it in SQL.</remarks>
public sealed class NetworkView
{
    /// <summary>Value of the network's change counter.</summary>
    public required long Version { get; init; }

    /// <summary>The bands that exist.</summary>
    public required BandPlan Plan { get; init; }

    /// <summary>All stations by ascending code.</summary>
    public required IReadOnlyList<Station> Stations { get; init; }

    /// <summary>All regions that have a station, those that exist by themselves included, by ascending code.</summary>
    public required IReadOnlyList<Region> Regions { get; init; }

    /// <summary>The station of a code, or <c>null</c>.</summary>
    public Station? FindStation(string code) => throw new NotSupportedException("Not built yet.");

    /// <summary>The region of a code, or <c>null</c>; <c>all</c>, <c>itu-n</c>, <c>field-xx</c> and <c>square-xxnn</c> always exist.</summary>
    public Region? FindRegion(string code) => throw new NotSupportedException("Not built yet.");
}
