using Bandtide.Core.Bands;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>The band plan.</summary>
internal static class BandsApi
{
    public static void MapBands(this IEndpointRouteBuilder routes)
    {
        routes.MapGet("/bands", ListAsync).WithName("listBands").WithTags("Bands").WithSummary("All bands, by layer and ascending frequency")
            .Produces<IReadOnlyList<BandAnswer>>();
        routes.MapGet("/bands/{code}", GetAsync).WithName("getBand").WithTags("Bands").WithSummary("One band")
            .Produces<BandAnswer>().Refuses(400, 404);
    }

    private static async Task<IResult> ListAsync(NetworkStore network, CancellationToken ct) =>
        Results.Ok((await network.GetAsync(ct)).Plan.All.Select(Answer));

    private static async Task<IResult> GetAsync(string code, NetworkStore network, CancellationToken ct) =>
        (await network.GetAsync(ct)).Plan.TryGet(code, out var band) ? Results.Ok(Answer(band))
            : Core.Codes.IsValid(code) ? Problems.NotFound($"There is no band '{code}'.")
            : Problems.Bad("code", "code-syntax", "A band's code is 2 to 24 of a-z, 0-9 and -.");

    private static BandAnswer Answer(Band band) => new(
        band.Code, Core.Heatmaps.HeatmapQueryText.Code(band.Layer), band.Name, band.Label,
        [.. band.Segments.Select(segment => new SegmentAnswer(segment.LowHz / 1000.0, segment.HighHz / 1000.0))]);
}
