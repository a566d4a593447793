using System.Collections.Immutable;
using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Stations;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Model;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Network;

/// <summary>Reads all small tables into a <see cref="NetworkView"/>.</summary>
internal static class NetworkLoader
{
    /// <summary>The network as the session's transaction sees it.</summary>
    public static async Task<NetworkView> LoadAsync(BandtideContext context, CancellationToken ct)
    {
        var version = await context.MonthChanges.Where(row => row.Month == MonthChangeRow.Network).Select(row => row.Counter).SingleAsync(ct);
        var stations = await StationsAsync(context, ct);
        var regions = await RegionsAsync(context, stations, ct);
        return new()
        {
            Version = version,
            Plan = await PlanAsync(context, ct),
            Stations = stations,
            Regions = [.. regions.Concat(OwnRegions.Of(stations)).OrderBy(region => region.Code, StringComparer.Ordinal)],
        };
    }

    private static async Task<List<Station>> StationsAsync(BandtideContext context, CancellationToken ct)
    {
        var setups = (await context.Setups.AsNoTracking().ToListAsync(ct)).ToLookup(row => row.StationId);
        var rows = await context.Stations.AsNoTracking().ToListAsync(ct);
        return [.. rows
            .Select(row => new Station(
                row.Id, row.Code, row.Name, new(row.LatitudeDegrees, row.LongitudeDegrees), row.LevelUnit, row.ItuRegion,
                [.. setups[row.Id].OrderBy(setup => setup.ValidFrom).ThenBy(setup => setup.Sequence).Select(ToSetup)]))
            .OrderBy(station => station.Code, StringComparer.Ordinal)];
    }

    private static Setup ToSetup(SetupRow row) => new(
        EpochDay.ToDate(row.ValidFrom), row.Threshold, row.MarginDb, row.Averages, row.Detector, row.ResolutionHz, row.NoiseBandwidthHz,
        row.RevisitSeconds, row.AntennaFactorDb, row.Environment, row.Receiver, row.Antenna, row.Note);

    private static async Task<List<Region>> RegionsAsync(BandtideContext context, List<Station> stations, CancellationToken ct)
    {
        var members = (await context.RegionStations.AsNoTracking().ToListAsync(ct)).ToLookup(row => row.RegionId, row => row.StationId);
        var locators = (await context.RegionLocators.AsNoTracking().ToListAsync(ct)).ToLookup(row => row.RegionId, row => row.Locator);
        var rows = await context.Regions.AsNoTracking().ToListAsync(ct);
        return rows.ConvertAll(row => row.Kind == RegionKind.List
            ? ListRegion(row, [.. members[row.Id]], stations)
            : LocatorRegion(row, [.. locators[row.Id].Order(StringComparer.Ordinal)], stations));
    }

    private static Region ListRegion(RegionRow row, HashSet<int> members, List<Station> stations) =>
        new(row.Code, row.Name, row.Kind, [], stations.FindAll(station => members.Contains(station.Id)));

    private static Region LocatorRegion(RegionRow row, IReadOnlyList<string> texts, List<Station> stations)
    {
        var locators = texts.Select(MaidenheadLocator.Parse).ToList();
        return new(row.Code, row.Name, row.Kind, texts,
            stations.FindAll(station => locators.Exists(locator => locator.Contains(station.Square))));
    }

    private static async Task<BandPlan> PlanAsync(BandtideContext context, CancellationToken ct)
    {
        var segments = (await context.BandSegments.AsNoTracking().ToListAsync(ct)).ToLookup(row => row.BandId);
        var bands = await context.Bands.AsNoTracking().OrderBy(row => row.Id).ToListAsync(ct);
        var extension = BandPlan.Standard.With(bands.Select(row => new Band(
            row.Id, row.Code, row.Layer, row.Name,
            [.. segments[row.Id].OrderBy(segment => segment.LowHz).Select(segment => new FrequencySegment(segment.LowHz, segment.HighHz))])));

        // Every addition was checked before it was stored, so this is a damaged or foreign store.
        return extension.Plan ?? throw new InvalidDataException(
            $"The stored bands do not fit together: {string.Join(' ', extension.Problems.Select(problem => $"{problem.Code}: {problem.Message}"))}");
    }
}
