using System.Globalization;
using System.Text;
using Bandtide.Core.Heatmaps;
using Bandtide.Server.Demo;
using Bandtide.Server.Figures;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Api;

/// <summary>Pooled hour-by-band values.</summary>
internal static class HeatmapApi
{
    private const string Json = "application/json";
    private const string Csv = "text/csv";
    private const string Svg = "image/svg+xml";

    public static void MapHeatmap(this IEndpointRouteBuilder routes) =>
        routes.MapGet("/heatmap", GetAsync).WithName("getHeatmap").WithTags("Heatmap")
            .WithSummary("Hour-by-band values pooled over stations and days, as numbers or as a picture")
            .WithDescription("Every list of lists has a row per band and 24 entries per row. Numbers are rounded to six decimals, a hundred times finer than what is stored; null means not observed. lower and upper are the 95 % interval of a mean. comparable is there, and false, where levels of these stations must not be compared; note says what else a reader should know.")
            .Produces<HeatmapShape>(200, Json, Csv, Svg).Produces(304).Refuses(400, 404, 406);

    private static async Task<IResult> GetAsync(HttpContext context, HeatmapReader reader, NetworkStore network, CancellationToken ct)
    {
        context.Response.Headers.Vary = "Accept";
        var values = context.Request.Query;
        var query = HeatmapQueryText.Parse(name => [.. values[name].OfType<string>()], out var found);
        var problems = found.ToList();
        problems.AddRange(values.Keys.Where(name => name is not "format" && !HeatmapQueryText.Names.Contains(name, StringComparer.Ordinal))
            .Select(name => new QueryProblem(name.Length <= 40 ? name : name[..40], "name-unknown", "This query value does not exist.")));
        var format = values["format"].Count == 0 ? null : values["format"].ToString();
        if (format is not (null or "json" or "csv" or "svg"))
        {
            problems.Add(new("format", "choice", "format must be json, csv or svg."));
        }

        var type = format switch { "json" => Json, "csv" => Csv, "svg" => Svg, _ => Negotiation.Choose(context.Request, Json, Csv, Svg) };
        var revision = query is null ? null : await reader.RevisionAsync(query, ct);
        if (query is not null && revision is null)
        {
            return Problems.NotFound(query.Station is null ? $"There is no region '{query.Region}'." : $"There is no station '{query.Station}'.");
        }

        if (query is null && await UnknownAsync(values, network, ct) is { } unknown)
        {
            return unknown;
        }

        if (type is null)
        {
            return Problems.NotAcceptable($"{Json}, {Csv} and {Svg}");
        }

        return query is null || problems.Count > 0 ? Problems.Bad(problems) : await AnswerAsync(context, reader, network, query, revision!, type, ct);
    }

    // 404 goes before what else may be wrong with a query.
    private static async Task<IResult?> UnknownAsync(IQueryCollection values, NetworkStore network, CancellationToken ct)
    {
        var view = await network.GetAsync(ct);
        string? Code(string name) => values[name] is [{ } text] && Core.Codes.IsValid(text) ? text : null;
        return Code("station") is { } station && view.FindStation(station) is null ? Problems.NotFound($"There is no station '{station}'.")
            : Code("region") is { } region && view.FindRegion(region) is null ? Problems.NotFound($"There is no region '{region}'.")
            : null;
    }

    private static async Task<IResult> AnswerAsync(
        HttpContext context, HeatmapReader reader, NetworkStore network, HeatmapQuery query, string revision, string type, CancellationToken ct)
    {
        var text = HeatmapQueryText.ToQueryString(query);
        if (Tags.NotModified(context, Tags.Of(text, revision, type)))
        {
            return Results.StatusCode(StatusCodes.Status304NotModified);
        }

        switch (await reader.ReadAsync(query, ct))
        {
            case HeatmapOutcome.UnknownSelection unknown:
                return Problems.NotFound(unknown.Message);
            case HeatmapOutcome.Refused refused:
                context.Response.Headers.Remove("ETag");
                return Problems.Bad(refused.Field, refused.Rule, refused.Message);
            case HeatmapOutcome.Answered { Answer: var answer }:
                context.Response.Headers.ETag = Tags.Of(text, answer.Revision, type);
                return type switch
                {
                    Csv => Results.Text(CsvOf(answer), "text/csv", Encoding.UTF8),
                    Svg => Picture(context, answer, await network.GetAsync(ct)),
                    _ => Results.Json(Shape(answer)),
                };
            default:
                throw new InvalidOperationException("An outcome without an answer.");
        }
    }

    private static IResult Picture(HttpContext context, HeatmapAnswer answer, NetworkView network)
    {
        // A club's own site may show it, as a picture or in a frame.
        context.Response.Headers["Cross-Origin-Resource-Policy"] = "cross-origin";
        context.Response.Headers.ContentSecurityPolicy = "default-src 'none'";
        var figure = HeatmapFigure.Of(answer, FigureWords.PlaceName(network, answer.Query));

        // Elsewhere no page stands around the picture to say so.
        return Results.Text(
            HeatmapSvg.Render(network.FindRegion(DemoScenario.Region) is null ? figure : figure with { Caption = [.. figure.Caption, "Invented demonstration data."] }),
            Svg,
            Encoding.UTF8);
    }

    internal static HeatmapShape Shape(HeatmapAnswer answer)
    {
        var map = answer.Heatmap;
        IReadOnlyList<IReadOnlyList<T>> Rows<T>(Func<HeatmapCell, T> value) =>
            [.. map.Bands.Select((_, b) => (IReadOnlyList<T>)[.. Enumerable.Range(0, 24).Select(hour => value(map[b, hour]))])];
        return new(
            answer.Query.Measure.Info().Code, answer.Unit, HeatmapQueryText.Code(answer.Query.Statistic), HeatmapQueryText.Code(answer.Query.Clock),
            [.. Enumerable.Range(0, 24)], [.. map.Bands.Select(band => band.Code)],
            Rows(cell => Rounded(cell.Value)), Rows(cell => cell.Stations), Rows(cell => cell.Days),
            Rows(cell => Rounded(cell.Lower)), Rows(cell => Rounded(cell.Upper)), answer.Revision,
            answer.NotComparable is null ? null : false, answer.NotComparable, answer.Note);
    }

    private static string CsvOf(HeatmapAnswer answer)
    {
        var text = new StringBuilder("band,hour,value,lower,upper,stations,days\n");
        for (var b = 0; b < answer.Heatmap.Bands.Count; b++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var cell = answer.Heatmap[b, hour];
                text.Append(CultureInfo.InvariantCulture, $"{answer.Heatmap.Bands[b].Code},{hour},{Rounded(cell.Value):0.######},{Rounded(cell.Lower):0.######},{Rounded(cell.Upper):0.######},{cell.Stations},{cell.Days}\n");
            }
        }

        return text.ToString();
    }

    // Six decimals are a hundred times finer than what is stored.
    private static double? Rounded(double value) => double.IsFinite(value) ? Math.Round(value, 6) + 0.0 : null;
}
