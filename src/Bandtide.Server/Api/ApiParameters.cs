using System.Text.Json.Nodes;
using Bandtide.Core.Heatmaps;
using Microsoft.OpenApi;

namespace Bandtide.Server.Api;

/// <summary>What query and path values mean, for the API's description.</summary>
internal static class ApiParameters
{
    private static readonly (string Name, string Description, string? Example, string? Fallback, string[] Choices)[] HeatmapTable =
    [
        ("region", "Code of a region: all, itu-1 to itu-3, field-ko, square-ko33, or one drawn up by a coordinator. Region or station is required.", "all", null, []),
        ("station", "Code of a station.", "north-hut", null, []),
        ("month", "One month, yyyy-MM. One of month, from with to, or season is required.", "2026-06", null, []),
        ("from", "First month of a range, yyyy-MM.", "2026-04", null, []),
        ("to", "Last month of a range, included.", "2026-06", null, []),
        ("season", "A meteorological season, of each station's own hemisphere; the one that spans New Year takes January's year.", "winter", null, ["winter", "spring", "summer", "autumn"]),
        ("years", "Years of the season, 2024 or 2024..2026; all when left out.", "2024..2026", null, []),
        ("measure", "What is shown.", null, "occupancy", [.. Measures.All.Select(info => info.Code)]),
        ("stat", "How days and stations become one value.", null, "mean", ["mean", "median", "p10", "p90", "sd"]),
        ("clock", "Clock of the hours: UTC, or each station's local apparent solar time.", null, "utc", ["utc", "solar"]),
        ("layer", "Bands of the Radio Regulations, or slices of 1 MHz.", null, "service", ["service", "slice"]),
        ("adjust", "Composition adjustment; none so far.", null, "none", ["none"]),
        ("interval", "The 95 % interval of a mean, or none.", null, "auto", ["auto", "none"]),
        ("align", "Seasons of each station's hemisphere, or all as in the north.", null, "local", ["local", "calendar"]),
        ("vote", "One vote for each station, or for each Maidenhead square.", null, "station", ["station", "square"]),
        ("mindays", "Leave out of a cell stations with fewer days in it.", null, "1", []),
        ("minsweeps", "Leave out cells with fewer sweeps.", null, "1", []),
        ("format", "Overrides Accept, for links.", null, null, ["json", "csv", "svg"]),
    ];

    // The query values of a heatmap.
    private static IReadOnlyList<OpenApiParameter> Heatmap => [.. HeatmapTable.Select(row => new OpenApiParameter
    {
        Name = row.Name,
        In = ParameterLocation.Query,
        Description = row.Description,
        Example = row.Example is null ? null : JsonValue.Create(row.Example),
        Schema = new OpenApiSchema
        {
            Type = row.Name.StartsWith("min", StringComparison.Ordinal) ? JsonSchemaType.Integer : JsonSchemaType.String,
            Enum = row.Choices.Length == 0 ? null : [.. row.Choices.Select(choice => (JsonNode)JsonValue.Create(choice))],
            Default = row.Fallback is null ? null : row.Name.StartsWith("min", StringComparison.Ordinal) ? JsonValue.Create(1) : JsonValue.Create(row.Fallback),
        },
    })];

    /// <summary>Completes the path and query values of an operation.</summary>
    public static void Complete(OpenApiOperation operation)
    {
        if (string.Equals(operation.OperationId, "getHeatmap", StringComparison.Ordinal))
        {
            operation.Parameters = [.. Heatmap];
        }

        foreach (var parameter in (operation.Parameters ?? []).OfType<OpenApiParameter>())
        {
            var name = parameter.Name ?? "";
            if (Special.TryGetValue((operation.OperationId ?? "", name), out var known) || Known.TryGetValue(name, out known))
            {
                parameter.Description ??= known.Description;
                parameter.Example ??= JsonValue.Create(known.Example);
            }

            if (parameter.Schema is OpenApiSchema schema)
            {
                Complete(schema, name);
            }
        }
    }

    private static void Complete(OpenApiSchema schema, string name)
    {
        switch (name)
        {
            case "code" or "region" or "station":
                schema.Pattern = ApiSchemas.CodePattern;
                break;
            case "date":
                schema.Format = "date";
                break;
            case "restore":
                schema.Enum = ["true", "false"];
                schema.Default = "false";
                break;
            case "format" when schema.Enum is null:
                schema.Enum = ["json", "csv"];
                break;
        }
    }

    // Where a name means something else in one call.
    private static readonly Dictionary<(string Operation, string Name), (string Description, string Example)> Special = new()
    {
        [("getBand", "code")] = ("Code of the band: 2 to 24 of a-z, 0-9 and -.", "bc-49m"),
        [("getRegion", "code")] = ("Code of the region: 2 to 24 of a-z, 0-9 and -.", "baltic"),
        [("listDays", "from")] = ("First date, yyyy-MM-dd; from the beginning when left out.", "2026-06-01"),
        [("listDays", "to")] = ("Last date, included, yyyy-MM-dd; to the end when left out.", "2026-06-30"),
        [("getCoverage", "station")] = ("Code of a station. Station or region is required, not both.", "north-hut"),
        [("getCoverage", "region")] = ("Code of a region.", "all"),
        [("getCoverage", "month")] = ("One month, yyyy-MM. Either month or from with to is required.", "2026-06"),
        [("getCoverage", "from")] = ("First month of a range, yyyy-MM.", "2026-04"),
        [("getCoverage", "to")] = ("Last month of a range, included.", "2026-06"),
    };

    // Descriptions and examples by name.
    private static readonly Dictionary<string, (string Description, string Example)> Known = new(StringComparer.Ordinal)
    {
        ["code"] = ("Code of the station: 2 to 24 of a-z, 0-9 and -.", "north-hut"),
        ["date"] = ("UTC date, yyyy-MM-dd.", "2026-06-01"),
        ["id"] = ("Identity of the key.", "7"),
        ["revision"] = ("A revision, from 1; the current one when left out.", "1"),
        ["restore"] = ("true: days that were withdrawn are stored anew.", "false"),
        ["region"] = ("Code of a region: only its stations.", "all"),
        ["format"] = ("Overrides Accept, for links.", "json"),
    };
}
