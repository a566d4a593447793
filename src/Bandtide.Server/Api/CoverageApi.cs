using System.Globalization;
using System.Numerics;
using System.Text;
using Bandtide.Core;
using Bandtide.Core.Time;
using Bandtide.Storage.Coverage;

namespace Bandtide.Server.Api;

/// <summary>Station by day: what was reported.</summary>
internal static class CoverageApi
{
    private const string Json = "application/json";
    private const string Csv = "text/csv";
    private const int MostMonths = 120;
    private static readonly string[] Names = ["station", "region", "month", "from", "to", "format"];

    public static void MapCoverage(this IEndpointRouteBuilder routes) =>
        routes.MapGet("/coverage", GetAsync).WithName("getCoverage").WithTags("Coverage").WithSummary("Who reported when, station by day")
            .WithDescription("Hours, cells and bands have a row per station and an entry per date: null where nothing was ever sent, 0 where the day was withdrawn. CSV has a line for each day that was sent.")
            .Produces<CoverageShape>(200, Json, Csv).Produces(304).Refuses(400, 404, 406);

    private static async Task<IResult> GetAsync(
        HttpContext context, CoverageReader reader, CancellationToken ct, string? station = null, string? region = null, string? month = null,
        string? from = null, string? to = null, string? format = null)
    {
        context.Response.Headers.Vary = "Accept";
        var check = new FieldCheck();
        if (station is null == region is null)
        {
            check.Add("region", "selection", "Name a region or a station, one of the two.");
        }
        else if (!Codes.IsValid(station ?? region!))
        {
            check.Add(station is null ? "region" : "station", "code-syntax", "A code is 2 to 24 of a-z, 0-9 and -.");
        }

        if (month is null == (from is null && to is null))
        {
            check.Add("month", "period", "Name a period: month, or from and to.");
        }

        var first = Month(check, month is null ? "from" : "month", month ?? from);
        var last = Month(check, month is null ? "to" : "month", month ?? to);
        if (last.Number < first.Number || last.Number - first.Number >= MostMonths)
        {
            check.Add("to", "range-order", $"to must not come before from, nor lie {MostMonths} months or more after it.");
        }

        foreach (var name in context.Request.Query.Keys.Where(name => !Names.Contains(name, StringComparer.Ordinal)))
        {
            check.Add(name.Length <= 40 ? name : name[..40], "name-unknown", "This query value does not exist.");
        }

        if (format is not (null or "json" or "csv"))
        {
            check.Add("format", "choice", "format must be json or csv.");
        }

        if (check.Problem is { } problem)
        {
            return problem;
        }

        if (await reader.ReadAsync(station, region, first, last, ct) is not { } answer)
        {
            return Problems.NotFound(station is null ? $"There is no region '{region}'." : $"There is no station '{station}'.");
        }

        var type = format switch { "json" => Json, "csv" => Csv, _ => Negotiation.Choose(context.Request, Json, Csv) };
        return type is null ? Problems.NotAcceptable($"{Json} and {Csv}")
            : Tags.NotModified(context, Tags.Of(station ?? "", region ?? "", first.ToString(), last.ToString(), answer.Revision, type)) ? Results.StatusCode(304)
            : type is Csv ? Results.Text(CsvOf(answer), "text/csv", Encoding.UTF8)
            : Results.Json(Shape(answer));
    }

    private static YearMonth Month(FieldCheck check, string name, string? text)
    {
        if (!YearMonth.TryParse(text, CultureInfo.InvariantCulture, out var month))
        {
            check.Add(name, "month-syntax", $"{name} must be a month, yyyy-MM.");
        }

        return month;
    }

    private static CoverageShape Shape(CoverageAnswer answer)
    {
        IReadOnlyList<IReadOnlyList<int?>> Rows(Func<CoverageDay, int> value) =>
            [.. answer.Days.Select(row => (IReadOnlyList<int?>)[.. row.Select(day => day is { } known ? value(known) : (int?)null)])];
        return new(
            DateText.Format(answer.From), DateText.Format(answer.To),
            [.. Enumerable.Range(0, answer.To.DayNumber - answer.From.DayNumber + 1).Select(n => DateText.Format(answer.From.AddDays(n)))],
            [.. answer.Stations.Select(station => station.Code)],
            Rows(day => BitOperations.PopCount((uint)day.HoursMask)), Rows(day => day.Cells), Rows(day => day.Bands), answer.Revision);
    }

    private static string CsvOf(CoverageAnswer answer)
    {
        var text = new StringBuilder("station,date,hours,cells,bands,withdrawn\n");
        for (var s = 0; s < answer.Stations.Count; s++)
        {
            for (var n = 0; n < answer.Days[s].Count; n++)
            {
                if (answer.Days[s][n] is { } day)
                {
                    text.Append(CultureInfo.InvariantCulture, $"{answer.Stations[s].Code},{DateText.Format(answer.From.AddDays(n))},{BitOperations.PopCount((uint)day.HoursMask)},{day.Cells},{day.Bands},{(day.IsWithdrawn ? "true" : "false")}\n");
                }
            }
        }

        return text.ToString();
    }
}
