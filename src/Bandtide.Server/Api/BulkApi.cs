using Bandtide.Core.Sheets;
using Bandtide.Storage.Days;
using Bandtide.Storage.Network;
using Microsoft.AspNetCore.Http.Features;
using Microsoft.AspNetCore.Server.Kestrel.Core.Features;
using Microsoft.Extensions.Options;

namespace Bandtide.Server.Api;

/// <summary>Many days in one body, stored as they arrive.</summary>
internal static class BulkApi
{
    private const string Ndjson = "application/x-ndjson";
    private const string Csv = "text/csv";

    public static void MapBulk(this IEndpointRouteBuilder routes) =>
        routes.MapPost("/stations/{code}/days", PostAsync).WithName("postDays").WithTags("Days")
            .WithSummary("Store many days: CSV with a date column, or NDJSON of day sheets; one line per day answers")
            .WithDescription("Atomic per day. The answer's lines come in the order of the body; a line that says created, replaced or unchanged is durable when it is sent. Sending all again is harmless.")
            .TakesBody<DaySheetShape>(Csv, Ndjson).Produces<ReceiptAnswer>(200, Ndjson).Refuses(400, 404, 406, 415).WithKey();

    private static async Task<IResult> PostAsync(
        HttpContext context, string code, NetworkStore network, DayStore days, IOptions<UploadOptions> options, TimeProvider clock, CancellationToken ct,
        string? restore = null)
    {
        var view = await network.GetAsync(ct);
        if (!StationRoute.TryWrite(context, view, code, out var station, out var problem))
        {
            return problem;
        }

        if (RequestBody.MediaType(context.Request, Csv, Ndjson) is not { } type)
        {
            return RequestBody.Unsupported($"{Csv} or {Ndjson}");
        }

        if (Negotiation.Choose(context.Request, Ndjson, "application/json") is null)
        {
            return Problems.NotAcceptable(Ndjson);
        }

        if (restore is not (null or "" or "true" or "false"))
        {
            return Problems.Bad("restore", "choice", "restore must be true or false.");
        }

        LiftLimits(context);
        var rules = new SheetContext(view.Plan, clock.GetUtcNow());
        IBulkReader reader = type is Csv ? new BulkCsvReader(rules) : new BulkJsonReader(rules);
        var patience = options.Value.Silence;
        await using var receipts = new ReceiptWriter(context, patience, clock);
        var upload = new BulkUpload(station, days, restore is "true", reader, receipts, RequestBody.Decoded(context.Request), patience, clock);
        var refused = await upload.RunAsync();
        return refused ?? Results.Empty;
    }

    // A body may come slowly, and its sender may read the answer only when all is sent; silence alone ends the patience.
    private static void LiftLimits(HttpContext context)
    {
        if (context.Features.Get<IHttpMinRequestBodyDataRateFeature>() is { } inward)
        {
            inward.MinDataRate = null;
        }

        if (context.Features.Get<IHttpMinResponseDataRateFeature>() is { } outward)
        {
            outward.MinDataRate = null;
        }
    }
}
