using System.Globalization;
using System.Text.Json.Nodes;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Microsoft.AspNetCore.OpenApi;
using Microsoft.OpenApi;

namespace Bandtide.Server.Api;

/// <summary>What the types of the wire shapes do not tell: ranges, choices and the form of texts, for the API's description.</summary>
internal static class ApiSchemas
{
    /// <summary>Form of codes of stations, regions and bands.</summary>
    public const string CodePattern = "^[a-z0-9-]{2,24}$";

    private const string Share = "0..1";
    private const string Decibels = "-300..300";

    private static readonly Dictionary<(Type Type, string Name), string> Ranges = new()
    {
        [(typeof(CellShape), "hour")] = "0..23",
        [(typeof(CellShape), "sweeps")] = string.Create(CultureInfo.InvariantCulture, $"1..{SheetFields.MaxSweeps}"),
        [(typeof(CellShape), "occupancy")] = Share,
        [(typeof(CellShape), "steady")] = Share,
        [(typeof(CellShape), "coverage")] = Share,
        [(typeof(CellShape), "signal")] = Decibels,
        [(typeof(CellShape), "level")] = Decibels,
        [(typeof(CellShape), "levelP90")] = Decibels,
        [(typeof(CellShape), "floor")] = Decibels,
        [(typeof(StationRequest), "latitude")] = "-90..90",
        [(typeof(StationRequest), "longitude")] = "-180..180",
        [(typeof(SetupShape), "marginDb")] = "0..100",
        [(typeof(SetupShape), "averages")] = "1..1000000",
        [(typeof(SetupShape), "resolutionHz")] = "0.001..30000000",
        [(typeof(SetupShape), "noiseBandwidthHz")] = "0.001..30000000",
        [(typeof(SetupShape), "revisitSeconds")] = "0.001..86400",
        [(typeof(SetupShape), "antennaFactorDb")] = "-200..200",
    };

    private static readonly Dictionary<(Type Type, string Name), IReadOnlyList<string>> Choices = new()
    {
        [(typeof(StationRequest), "levelUnit")] = LevelUnits.All,
        [(typeof(StationAnswer), "levelUnit")] = LevelUnits.All,
        [(typeof(SetupShape), "threshold")] = SetupShape.Thresholds,
        [(typeof(SetupShape), "detector")] = SetupShape.Detectors,
        [(typeof(SetupShape), "environment")] = SetupShape.Environments,
        [(typeof(ReceiptAnswer), "status")] = ["created", "replaced", "unchanged", "withdrawn"],
        [(typeof(RefusedDayAnswer), "status")] = ["refused"],
        [(typeof(RevisionListing), "status")] = ["stored", "withdrawn"],
        [(typeof(RegionAnswer), "kind")] = ["everything", "itu-region", "field", "square", "list", "locators"],
        [(typeof(BandAnswer), "layer")] = ["service", "slice"],
        [(typeof(HeatmapShape), "measure")] = [.. Measures.All.Select(info => info.Code)],
        [(typeof(HeatmapShape), "stat")] = ["mean", "median", "p10", "p90", "sd"],
        [(typeof(HeatmapShape), "clock")] = ["utc", "solar"],
    };

    private static readonly HashSet<string> Dates = ["date", "validFrom"];

    private static readonly HashSet<(Type, string)> Codes =
    [
        (typeof(StationRequest), "code"), (typeof(StationAnswer), "code"), (typeof(RegionRequest), "code"), (typeof(RegionAnswer), "code"),
        (typeof(BandAnswer), "code"), (typeof(CellShape), "band"), (typeof(ReceiptAnswer), "station"),
    ];

    /// <summary>Adds them to a property's schema.</summary>
    public static Task CompleteAsync(OpenApiSchema schema, OpenApiSchemaTransformerContext context, CancellationToken ct)
    {
        if (context.JsonPropertyInfo is not { } property)
        {
            return Task.CompletedTask;
        }

        var place = (property.DeclaringType, property.Name);
        if (Ranges.TryGetValue(place, out var range))
        {
            (schema.Minimum, schema.Maximum) = (range.Split("..")[0], range.Split("..")[1]);
        }

        if (Choices.TryGetValue(place, out var choices))
        {
            schema.Enum = [.. choices.Select(choice => (JsonNode)JsonValue.Create(choice))];
            if (schema.Type?.HasFlag(JsonSchemaType.Null) == true)
            {
                schema.Enum.Add(JsonNullSentinel.JsonNull);
            }
        }

        if (Dates.Contains(property.Name) && property.DeclaringType != typeof(RefusedDayAnswer))
        {
            schema.Format = "date";
        }

        if (Codes.Contains(place))
        {
            schema.Pattern = CodePattern;
        }

        return Task.CompletedTask;
    }
}
