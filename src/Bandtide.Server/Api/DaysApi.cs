using System.Buffers;
using System.Diagnostics.CodeAnalysis;
using System.Globalization;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Days;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>One day sheet: store, read back, withdraw, history.</summary>
internal static class DaysApi
{
    private const string Json = "application/json";
    private const string Csv = "text/csv";

    public static void MapDays(this IEndpointRouteBuilder routes)
    {
        routes.MapPut("/stations/{code}/days/{date}", PutAsync).WithName("putDay").WithTags("Days").WithSummary("Store one day; sending it again replaces it")
            .TakesBody<DaySheetShape>(Json, Csv).Produces<ReceiptAnswer>(201).Produces<ReceiptAnswer>().Refuses(400, 404, 406, 413, 415).WithKey();
        routes.MapGet("/stations/{code}/days/{date}", GetAsync).WithName("getDay").WithTags("Days").WithSummary("Read a day back, now or as it was")
            .Produces<DaySheetShape>(200, Json, Csv).Produces(304).Refuses(400, 404, 406, 410);
        routes.MapDelete("/stations/{code}/days/{date}", WithdrawAsync).WithName("withdrawDay").WithTags("Days").WithSummary("Withdraw a day; its revisions stay readable")
            .Produces(204).Refuses(400, 404, 410).WithKey();
        routes.MapGet("/stations/{code}/days/{date}/revisions", RevisionsAsync).WithName("listRevisions").WithTags("Days").WithSummary("All revisions of a day, oldest first")
            .Produces<IReadOnlyList<RevisionListing>>().Refuses(400, 404);
        routes.MapGet("/stations/{code}/days", ListAsync).WithName("listDays").WithTags("Days").WithSummary("Current days with their checksums, to compare before sending")
            .Produces<IReadOnlyList<DayListing>>().Refuses(400, 404);
    }

    private static async Task<IResult> PutAsync(
        HttpContext context, string code, string date, NetworkStore network, DayStore days, TimeProvider clock, CancellationToken ct)
    {
        var view = await network.GetAsync(ct);
        if (!StationRoute.TryWrite(context, view, code, out var station, out var problem))
        {
            return problem;
        }

        if (RequestBody.MediaType(context.Request, Json, Csv) is not { } type)
        {
            return RequestBody.Unsupported($"{Csv} or {Json}");
        }

        (var body, problem) = await RequestBody.ReadAsync(context.Request, RequestBody.DayLimit, ct);
        if (problem is not null)
        {
            return problem;
        }

        if (Negotiation.Choose(context.Request, Json) is null)
        {
            return Problems.NotAcceptable(Json);
        }

        if (!StationRoute.TryDate(date, out var day, out problem))
        {
            return problem;
        }

        var rules = new SheetContext(view.Plan, clock.GetUtcNow());
        var reading = type is Csv ? DaySheetCsv.Read(body.Span, day, rules) : DaySheetJson.Read(body.Span, day, rules);
        if (reading.Sheet is not { } sheet)
        {
            return Problems.Bad(reading.Problems);
        }

        var receipts = await days.StoreAsync(station, [new(sheet, reading.Warnings)], restoreWithdrawn: true, ct);
        var receipt = ReceiptAnswer.Of(receipts[0]);
        return receipts[0].Status == DayStatus.Created
            ? Results.Created($"{Routes.Base}/stations/{code}/days/{date}", receipt)
            : Results.Ok(receipt);
    }

    private static async Task<IResult> GetAsync(
        HttpContext context, string code, string date, NetworkStore network, DayStore days, CancellationToken ct, string? revision = null)
    {
        context.Response.Headers.Vary = "Accept";
        var view = await network.GetAsync(ct);
        if (!StationRoute.TryFind(view, code, out var station, out var problem))
        {
            return problem;
        }

        var type = Negotiation.Choose(context.Request, Json, Csv);
        var wanted = 0;
        if (!StationRoute.TryDate(date, out var day, out problem) || (revision is not null && !TryRevision(revision, out wanted, out problem)))
        {
            return type is null ? Problems.NotAcceptable($"{Json} and {Csv}") : problem;
        }

        var stored = await days.FindAsync(station, day, revision is null ? null : wanted, ct);
        return stored is null ? Problems.NotFound(revision is null ? $"{code} has no day {date}." : $"{code} has no revision {wanted} of {date}.")
            : stored.Sheet is null ? Problems.Gone(revision is null ? $"The day {date} was withdrawn." : $"Revision {wanted} withdrew the day.")
            : type is null ? Problems.NotAcceptable($"{Json} and {Csv}")
            : Sheet(context, view.Plan, station, stored, type);
    }

    private static bool TryRevision(string text, out int revision, [NotNullWhen(false)] out IResult? problem)
    {
        problem = int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out revision) && revision > 0
            ? null
            : Problems.Bad("revision", "number-syntax", "A revision is a whole number from 1.");
        return problem is null;
    }

    private static IResult Sheet(HttpContext context, BandPlan plan, Station station, StoredDay stored, string type)
    {
        var tag = Tags.Of(station.Code, DateText.Format(stored.Date), stored.Revision.ToString(CultureInfo.InvariantCulture), stored.Checksum, type);
        if (Tags.NotModified(context, tag))
        {
            return Results.StatusCode(StatusCodes.Status304NotModified);
        }

        var body = new ArrayBufferWriter<byte>(64 * 1024);
        if (type is Csv)
        {
            DaySheetCsv.Write(body, stored.Sheet!, plan);
        }
        else
        {
            DaySheetJson.Write(body, new(stored.Date, stored.Sheet!), plan);
        }

        return Results.Bytes(body.WrittenMemory, type is Csv ? $"{Csv}; charset=utf-8" : Json);
    }

    private static async Task<IResult> WithdrawAsync(
        HttpContext context, string code, string date, NetworkStore network, DayStore days, CancellationToken ct)
    {
        if (!StationRoute.TryWrite(context, await network.GetAsync(ct), code, out var station, out var problem)
            || !StationRoute.TryDate(date, out var day, out problem))
        {
            return problem;
        }

        return await days.WithdrawAsync(station, day, ct) switch
        {
            null => Problems.NotFound($"{code} has no day {date}."),
            true => Results.NoContent(),
            false => Problems.Gone($"The day {date} was withdrawn already."),
        };
    }

    private static async Task<IResult> RevisionsAsync(string code, string date, NetworkStore network, DayStore days, CancellationToken ct)
    {
        if (!StationRoute.TryFind(await network.GetAsync(ct), code, out var station, out var problem)
            || !StationRoute.TryDate(date, out var day, out problem))
        {
            return problem;
        }

        var revisions = await days.RevisionsAsync(station, day, ct);
        return revisions.Count == 0
            ? Problems.NotFound($"{code} has no day {date}.")
            : Results.Ok(revisions.Select(stored => new RevisionListing(
                stored.Revision, stored.ReceivedAt, stored.IsWithdrawal ? "withdrawn" : "stored", stored.Cells, stored.IsWithdrawal ? null : stored.Checksum)));
    }

    private static async Task<IResult> ListAsync(
        string code, NetworkStore network, DayStore days, CancellationToken ct, string? from = null, string? to = null)
    {
        if (!StationRoute.TryFind(await network.GetAsync(ct), code, out var station, out var problem))
        {
            return problem;
        }

        var check = new FieldCheck();
        var (first, last) = (check.Date("from", from), check.Date("to", to));
        if (first > last)
        {
            check.Add("to", "range-order", "to must not come before from.");
        }

        if (check.Problem is { } refusal)
        {
            return refusal;
        }

        var listed = await days.ListAsync(station, first, last, ct);
        return Results.Ok(listed.Select(stored => new DayListing(DateText.Format(stored.Date), stored.Revision, stored.Checksum, stored.Cells)));
    }
}
