using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Stations;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Model;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Network;

/// <summary>Stations, setups, regions and bands: small tables, read whole, changed rarely and one change at a time.</summary>
public sealed class NetworkStore
{
    private readonly StoreDatabase database;
    private readonly TimeProvider clock;
    private volatile NetworkView? cached;

    internal NetworkStore(StoreDatabase database, TimeProvider clock) => (this.database, this.clock) = (database, clock);

    /// <summary>The network as it is now: from memory when its change counter has not moved.</summary>
    public async Task<NetworkView> GetAsync(CancellationToken ct) =>
        await AtAsync(await database.ReadAsync(session => ChangeCounters.NetworkAsync(session, ct), ct), ct);

    /// <summary>The network as this process saw it last: enough for what was judged by such a view before.</summary>
    internal async Task<NetworkView> LatestAsync(CancellationToken ct) => cached ?? await GetAsync(ct);

    /// <summary>The network not older than a value that its change counter was seen at.</summary>
    internal async Task<NetworkView> AtAsync(long version, CancellationToken ct)
    {
        if (cached is { } view && view.Version >= version)
        {
            return view;
        }

        return cached = await database.SnapshotAsync(async session =>
        {
            await using var context = await session.ContextAsync(ct);
            return await NetworkLoader.LoadAsync(context, ct);
        }, ct);
    }

    /// <summary>Registers a station. The code is taken as valid.</summary>
    public Task<StationCreation> CreateStationAsync(NewStation station, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        return ChangeAsync<StationCreation>(async (context, network) =>
        {
            if (network.FindStation(station.Code) is not null)
            {
                return (new StationCreation.DuplicateCode(), false);
            }

            var row = new StationRow
            {
                Code = station.Code,
                Name = station.Name,
                LatitudeDegrees = station.Position.LatitudeDegrees,
                LongitudeDegrees = station.Position.LongitudeDegrees,
                LevelUnit = station.Unit,
                ItuRegion = station.Regions.Select(OwnRegions.ItuRegion).FirstOrDefault(number => number is not null)
                    ?? ItuRegions.Guess(station.Position),
                CreatedAt = clock.GetUtcNow().ToUnixTimeMilliseconds(),
            };
            context.Stations.Add(row);
            await context.SaveChangesAsync(ct);
            await PutOnListsAsync(context, row.Id, station.Regions, ct);

            var after = await NetworkLoader.LoadAsync(context, ct);
            var refused = station.Regions.Where(code => after.FindRegion(code)?.Stations.Any(member => member.Id == row.Id) != true).ToList();
            return refused.Count > 0
                ? (new StationCreation.RefusedRegions(refused), false)
                : (new StationCreation.Created(after.FindStation(station.Code)!), true);
        }, ct);
    }

    /// <summary>Draws up a region. The code is taken as valid.</summary>
    public Task<RegionCreation> CreateRegionAsync(NewRegion region, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(region);
        return ChangeAsync<RegionCreation>(async (context, network) =>
        {
            if (RegionRules.Check(region, network) is { } refusal)
            {
                return (refusal, false);
            }

            var row = new RegionRow
            {
                Code = region.Code,
                Name = region.Name,
                Kind = region.Stations is null ? RegionKind.Locators : RegionKind.List,
            };
            context.Regions.Add(row);
            await context.SaveChangesAsync(ct);
            context.RegionStations.AddRange((region.Stations ?? []).Distinct(StringComparer.Ordinal)
                .Select(code => new RegionStationRow { RegionId = row.Id, StationId = network.FindStation(code)!.Id }));
            context.RegionLocators.AddRange((region.Locators ?? []).Select(text => MaidenheadLocator.Parse(text).ToString()).Distinct(StringComparer.Ordinal)
                .Select(text => new RegionLocatorRow { RegionId = row.Id, Locator = text }));
            await context.SaveChangesAsync(ct);
            return (new RegionCreation.Created((await NetworkLoader.LoadAsync(context, ct)).FindRegion(region.Code)!), true);
        }, ct);
    }

    /// <summary>Adds a setup to a station and returns the station with it. Of two with the same first date the later entry counts.</summary>
    public Task<Station> AddSetupAsync(Station station, Setup setup, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(setup);
        return ChangeAsync(async (context, _) =>
        {
            var last = await context.Setups.Where(row => row.StationId == station.Id).MaxAsync(row => (int?)row.Sequence, ct) ?? 0;
            context.Setups.Add(new()
            {
                StationId = station.Id,
                Sequence = last + 1,
                ValidFrom = EpochDay.Of(setup.ValidFrom),
                Threshold = setup.Threshold,
                MarginDb = setup.MarginDb,
                Averages = setup.Averages,
                Detector = setup.Detector,
                ResolutionHz = setup.ResolutionHz,
                NoiseBandwidthHz = setup.NoiseBandwidthHz,
                RevisitSeconds = setup.RevisitSeconds,
                AntennaFactorDb = setup.AntennaFactorDb,
                Environment = setup.Environment,
                Receiver = setup.Receiver,
                Antenna = setup.Antenna,
                Note = setup.Note,
            });
            await context.SaveChangesAsync(ct);
            return ((await NetworkLoader.LoadAsync(context, ct)).FindStation(station.Code)!, true);
        }, ct);
    }

    /// <summary>Adds a band to the plan of the whole network.</summary>
    public Task<BandAddition> AddBandAsync(
        BandLayer layer, string code, string name, IReadOnlyList<FrequencySegment> segments, CancellationToken ct) =>
        ChangeAsync<BandAddition>(async (context, network) =>
        {
            var band = new Band(network.Plan.NextId, code, layer, name, [.. segments.OrderBy(segment => segment.LowHz)]);
            var extension = network.Plan.With([band]);
            if (!extension.IsAccepted)
            {
                return (new BandAddition.Refused(extension.Problems), false);
            }

            context.Bands.Add(new() { Id = band.Id, Code = code, Layer = layer, Name = name });
            context.BandSegments.AddRange(band.Segments.Select(
                segment => new BandSegmentRow { BandId = band.Id, LowHz = segment.LowHz, HighHz = segment.HighHz }));
            await context.SaveChangesAsync(ct);
            return (new BandAddition.Added(band), true);
        }, ct);

    private static async Task PutOnListsAsync(BandtideContext context, int stationId, IReadOnlyList<string> codes, CancellationToken ct)
    {
        var lists = await context.Regions.Where(region => region.Kind == RegionKind.List && codes.Contains(region.Code))
            .Select(region => region.Id).ToListAsync(ct);
        context.RegionStations.AddRange(lists.Select(region => new RegionStationRow { RegionId = region, StationId = stationId }));
        await context.SaveChangesAsync(ct);
    }

    // Raising the counter first locks it: changes of the network come one after another, each sees the one before.
    private Task<T> ChangeAsync<T>(Func<BandtideContext, NetworkView, Task<(T, bool)>> change, CancellationToken ct) =>
        database.WriteAsync(async session =>
        {
            await database.Dialect.RaiseCountersAsync(session, [MonthChangeRow.Network], ct);
            await using var context = await session.ContextAsync(ct);
            return await change(context, await NetworkLoader.LoadAsync(context, ct));
        }, ct);
}
