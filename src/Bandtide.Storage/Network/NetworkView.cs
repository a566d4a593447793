using System.Collections.Frozen;
using Bandtide.Core.Bands;
using Bandtide.Core.Stations;

namespace Bandtide.Storage.Network;

/// <summary>All small tables at one moment: bands, stations with their setups, and regions. Immutable.</summary>
/// <remarks>Held in memory and replaced whole when the network's change counter moves; no query joins to it in SQL.</remarks>
public sealed class NetworkView
{
    private readonly FrozenDictionary<string, Station> stationsByCode = FrozenDictionary<string, Station>.Empty;
    private readonly FrozenDictionary<string, Region> regionsByCode = FrozenDictionary<string, Region>.Empty;

    /// <summary>Value of the network's change counter.</summary>
    public required long Version { get; init; }

    /// <summary>The bands that exist.</summary>
    public required BandPlan Plan { get; init; }

    /// <summary>All stations by ascending code.</summary>
    public required IReadOnlyList<Station> Stations
    {
        get;
        init => stationsByCode = (field = value).ToFrozenDictionary(station => station.Code, StringComparer.Ordinal);
    }

    /// <summary>
    /// The coordinators' regions, <c>all</c>, and those that exist by themselves and have a station, by ascending code.
    /// </summary>
    public required IReadOnlyList<Region> Regions
    {
        get;
        init => regionsByCode = (field = value).ToFrozenDictionary(region => region.Code, StringComparer.Ordinal);
    }

    /// <summary>The station of a code, or <c>null</c>.</summary>
    public Station? FindStation(string code) => stationsByCode.GetValueOrDefault(code);

    /// <summary>The region of a code, or <c>null</c>; <c>itu-1</c> to <c>itu-3</c> exist without a station too.</summary>
    public Region? FindRegion(string code) => regionsByCode.GetValueOrDefault(code) ?? OwnRegions.EmptyItuRegion(code);

    /// <summary>The stations of a selection, by ascending code, or <c>null</c> when there is no such station or region.</summary>
    /// <param name="station">Code of a station, or <c>null</c>.</param>
    /// <param name="region">Code of a region, read where <paramref name="station"/> is <c>null</c>.</param>
    public IReadOnlyList<Station>? Select(string? station, string? region) => station is not null
        ? FindStation(station) is { } one ? [one] : null
        : region is not null ? FindRegion(region)?.Stations : null;
}
