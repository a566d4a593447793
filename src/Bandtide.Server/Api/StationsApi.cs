using Bandtide.Core.Geography;
using Bandtide.Core.Stations;
using Bandtide.Server.Security;
using Bandtide.Storage.Keys;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>Stations and their setups.</summary>
internal static class StationsApi
{
    public static void MapStations(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/stations", ListAsync).WithName("listStations").WithTags("Stations").WithSummary("All stations, or those of a region")
            .Produces<IReadOnlyList<StationAnswer>>().Refuses(400, 404);
        routes.MapGet("/stations/{code}", GetAsync).WithName("getStation").WithTags("Stations").WithSummary("One station with its setups")
            .Produces<StationAnswer>().Refuses(400, 404);
        routes.MapPost("/stations", CreateAsync).WithName("createStation").WithTags("Stations").WithSummary("Register a station (coordinator)")
            .TakesBody<StationRequest>("application/json").Produces<StationWithKey>(201).Refuses(400, 406, 409, 413, 415).WithKey();
        routes.MapPost("/stations/{code}/setups", AddSetupAsync).WithName("addSetup").WithTags("Stations").WithSummary("Tell a setup, valid from a date")
            .TakesBody<SetupShape>("application/json").Produces<SetupShape>(201).Refuses(400, 404, 406, 413, 415).WithKey();
    }

    internal static StationAnswer Answer(Station station, NetworkView network) => new(
        station.Code, station.Name, station.Square.ToString(), station.Unit.Text(), station.ItuRegion,
        [.. network.Regions.Where(region => region.Stations.Any(member => member.Id == station.Id)).Select(region => region.Code)],
        [.. station.Setups.Select(SetupShape.Of)]);

    private static async Task<IResult> ListAsync(NetworkStore store, CancellationToken ct, string? region = null)
    {
        var network = await store.GetAsync(ct);
        if (region is not null && !Core.Codes.IsValid(region))
        {
            return Problems.Bad("region", "code-syntax", "A region's code is 2 to 24 of a-z, 0-9 and -.");
        }

        var stations = region is null ? network.Stations : network.FindRegion(region)?.Stations;
        return stations is null
            ? Problems.NotFound($"There is no region '{region}'.")
            : Results.Ok(stations.Select(station => Answer(station, network)));
    }

    private static async Task<IResult> GetAsync(string code, NetworkStore store, CancellationToken ct)
    {
        var network = await store.GetAsync(ct);
        return StationRoute.TryFind(network, code, out var station, out var problem) ? Results.Ok(Answer(station, network)) : problem;
    }

    private static async Task<IResult> CreateAsync(HttpContext context, NetworkStore network, KeyStore keys, CancellationToken ct)
    {
        if (!Caller.IsCoordinator(context))
        {
            return Problems.Forbidden();
        }

        var (request, problem) = await JsonObjects.ReadAsync<StationRequest>(context, ct);
        if (request is null)
        {
            return problem!;
        }

        var check = new FieldCheck();
        check.Code("code", request.Code);
        check.Text("name", request.Name, 100, required: true);
        check.Range("latitude", request.Latitude, -90, 90, required: true);
        check.Range("longitude", request.Longitude, -180, 180, required: true);
        check.OneOf("levelUnit", request.LevelUnit, LevelUnits.All, required: true);
        if (check.Problem is { } refusal)
        {
            return refusal;
        }

        var station = new NewStation(
            request.Code!, request.Name!, new GeoPoint(request.Latitude!.Value, request.Longitude!.Value),
            LevelUnits.Parse(request.LevelUnit)!.Value, [.. (request.Regions ?? []).OfType<string>()]);
        switch (await network.CreateStationAsync(station, ct))
        {
            case StationCreation.Created created:
                var (_, key) = await keys.IssueAsync(created.Station.Id, "first key", ct);
                var answer = new StationWithKey(Answer(created.Station, await network.GetAsync(ct)), key);
                return Results.Created($"{Routes.Base}/stations/{created.Station.Code}", answer);
            case StationCreation.RefusedRegions refused:
                return Problems.Bad("regions", "region-unknown", $"No such region, or not one of this position: {string.Join(", ", refused.Codes)}.");
            default:
                return Problems.Of(409, $"There is a station '{request.Code}' already.");
        }
    }

    private static async Task<IResult> AddSetupAsync(HttpContext context, string code, NetworkStore store, CancellationToken ct)
    {
        if (!StationRoute.TryWrite(context, await store.GetAsync(ct), code, out var station, out var refusal))
        {
            return refusal;
        }

        var (shape, problem) = await JsonObjects.ReadAsync<SetupShape>(context, ct);
        if (shape is null)
        {
            return problem!;
        }

        var check = new FieldCheck();
        if (shape.Check(check) is not { } setup)
        {
            return check.Problem!;
        }

        await store.AddSetupAsync(station, setup, ct);
        return Results.Created($"{Routes.Base}/stations/{code}", SetupShape.Of(setup));
    }
}
