using System.Globalization;
using Bandtide.Storage.Keys;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>Keys of a station: list, rotate, revoke.</summary>
internal static class KeysApi
{
    public static void MapKeys(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/stations/{code}/keys", ListAsync).WithName("listKeys").WithTags("Keys").WithSummary("The good keys of a station, without their text")
            .Produces<IReadOnlyList<KeyListing>>().Refuses(400, 404).WithKey();
        routes.MapPost("/stations/{code}/keys", IssueAsync).WithName("issueKey").WithTags("Keys").WithSummary("Make a further key; revoke the old one when it is in use")
            .Produces<KeyAnswer>(201).Refuses(400, 404).WithKey();
        routes.MapDelete("/stations/{code}/keys/{id}", RevokeAsync).WithName("revokeKey").WithTags("Keys").WithSummary("Revoke a key")
            .Produces(204).Refuses(400, 404).WithKey();
    }

    private static async Task<IResult> ListAsync(HttpContext context, string code, NetworkStore network, KeyStore keys, CancellationToken ct) =>
        StationRoute.TryWrite(context, await network.GetAsync(ct), code, out var station, out var problem)
            ? Results.Ok((await keys.ListAsync(station.Id, ct)).Select(key => new KeyListing(key.Id, key.Note, key.CreatedAt)))
            : problem;

    private static async Task<IResult> IssueAsync(HttpContext context, string code, NetworkStore network, KeyStore keys, CancellationToken ct)
    {
        if (!StationRoute.TryWrite(context, await network.GetAsync(ct), code, out var station, out var problem))
        {
            return problem;
        }

        var (scope, key) = await keys.IssueAsync(station.Id, "made through the API", ct);
        return Results.Created($"{Routes.Base}/stations/{code}/keys/{scope.KeyId}", new KeyAnswer(scope.KeyId, key));
    }

    private static async Task<IResult> RevokeAsync(
        HttpContext context, string code, string id, NetworkStore network, KeyStore keys, CancellationToken ct)
    {
        if (!StationRoute.TryWrite(context, await network.GetAsync(ct), code, out var station, out var problem))
        {
            return problem;
        }

        if (!int.TryParse(id, NumberStyles.None, CultureInfo.InvariantCulture, out var keyId))
        {
            return Problems.Bad("id", "number-syntax", "A key's id is a whole number.");
        }

        return await keys.RevokeAsync(station.Id, keyId, ct) ? Results.NoContent() : Problems.NotFound($"The station has no key {keyId}.");
    }
}
