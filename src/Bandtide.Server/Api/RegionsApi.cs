using Bandtide.Server.Security;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>Regions: named sets of stations.</summary>
internal static class RegionsApi
{
    public static void MapRegions(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/regions", ListAsync).WithName("listRegions").WithTags("Regions").WithSummary("All regions with their stations")
            .Produces<IReadOnlyList<RegionAnswer>>();
        routes.MapGet("/regions/{code}", GetAsync).WithName("getRegion").WithTags("Regions").WithSummary("One region")
            .Produces<RegionAnswer>().Refuses(400, 404);
        routes.MapPost("/regions", CreateAsync).WithName("createRegion").WithTags("Regions").WithSummary("Draw up a region (coordinator)")
            .TakesBody<RegionRequest>("application/json").Produces<RegionAnswer>(201).Refuses(400, 406, 409, 413, 415).WithKey();
    }

    private static async Task<IResult> ListAsync(NetworkStore network, CancellationToken ct) =>
        Results.Ok((await network.GetAsync(ct)).Regions.Select(Answer));

    private static async Task<IResult> GetAsync(string code, NetworkStore network, CancellationToken ct) =>
        (await network.GetAsync(ct)).FindRegion(code) is { } region ? Results.Ok(Answer(region))
            : Core.Codes.IsValid(code) ? Problems.NotFound($"There is no region '{code}'.")
            : Problems.Bad("code", "code-syntax", "A region's code is 2 to 24 of a-z, 0-9 and -.");

    private static async Task<IResult> CreateAsync(HttpContext context, NetworkStore network, CancellationToken ct)
    {
        if (!Caller.IsCoordinator(context))
        {
            return Problems.Forbidden();
        }

        var (request, problem) = await JsonObjects.ReadAsync<RegionRequest>(context, ct);
        if (request is null)
        {
            return problem!;
        }

        var check = new FieldCheck();
        check.Code("code", request.Code);
        check.Text("name", request.Name, 100, required: true);
        if ((request.Stations ?? []).Concat(request.Locators ?? []).Any(text => text is null))
        {
            check.Add("stations", "value-missing", "A list holds texts only.");
        }

        if (check.Problem is { } refusal)
        {
            return refusal;
        }

        return await network.CreateRegionAsync(new(request.Code!, request.Name!, request.Stations, request.Locators), ct) switch
        {
            RegionCreation.Created created => Results.Created($"{Routes.Base}/regions/{created.Region.Code}", Answer(created.Region)),
            RegionCreation.DuplicateCode => Problems.Of(409, $"There is a region '{request.Code}' already, or the code is kept."),
            RegionCreation.UnknownStations unknown => Problems.Bad("stations", "station-unknown", $"No such station: {string.Join(", ", unknown.Codes)}."),
            RegionCreation.InvalidLocators invalid => Problems.Bad("locators", "locator-syntax", $"Not a Maidenhead field or square: {string.Join(", ", invalid.Texts)}."),
            _ => Problems.Bad("stations", "members", "Name stations or locators, one of the two."),
        };
    }

    private static RegionAnswer Answer(Region region) => new(
        region.Code, region.Name, Kind(region.Kind), region.Kind == RegionKind.Locators ? region.Locators : null,
        [.. region.Stations.Select(station => station.Code)]);

    private static string Kind(RegionKind kind) => kind switch
    {
        RegionKind.Everything => "everything",
        RegionKind.ItuRegion => "itu-region",
        RegionKind.Field => "field",
        RegionKind.Square => "square",
        RegionKind.List => "list",
        _ => "locators",
    };
}
