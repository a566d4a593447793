using System.Text.Json;
using System.Text.Json.Nodes;
using Bandtide.Core.Sheets;

namespace Bandtide.Server.Api;

/// <summary>Examples of bodies, for the API's description.</summary>
internal static class ApiExamples
{
    private const string SheetCsv =
        "hour,band,sweeps,occupancy,signal,level,level_p90,floor,steady,coverage\n0,bc-49m,720,0.4312,-78.60,-96.10,-70.35,-98.40,0.02,1\n";

    private const string SheetJson =
        """{"date":"2026-06-01","cells":[{"hour":0,"band":"bc-49m","sweeps":720,"occupancy":0.4312,"signal":-78.60,"level":-96.10,"levelP90":-70.35,"floor":-98.40,"steady":0.02,"coverage":1}]}""";

    private const string Receipt =
        """{"station":"north-hut","date":"2026-06-01","status":"created","revision":1,"cells":1,"checksum":"2c1f0e3b5d7a9c8e0f1a2b3c4d5e6f70","warnings":[{"rule":"no-setup","count":1,"hour":null,"band":null,"message":"The station has told no setup; tell what is connected and how it measures."}]}""";

    private const string Setup =
        """{"validFrom":"2026-05-01","threshold":"floor+margin","marginDb":5,"averages":8,"detector":"power","resolutionHz":1000,"noiseBandwidthHz":1500,"revisitSeconds":5,"antennaFactorDb":12.5,"environment":"rural","receiver":"wide-band receiver, 16 bit","antenna":"active vertical, 1 m","note":"lightning arrestor fitted"}""";

    private const string Station =
        """{"code":"north-hut","name":"North hut","locator":"KO33","levelUnit":"dBm","ituRegion":1,"regions":["all","field-ko","itu-1","square-ko33"],"setups":[]}""";

    private static readonly string Hours = string.Join(",", Enumerable.Range(0, 24));

    private static readonly Dictionary<string, string> Requests = new(StringComparer.Ordinal)
    {
        ["createRegion"] = """{"code":"baltic","name":"Baltic coast","locators":["KO","JO"]}""",
        ["createStation"] = """{"code":"north-hut","name":"North hut","latitude":53.9,"longitude":27.56,"levelUnit":"dBm","regions":["itu-1"]}""",
        ["addSetup"] = Setup,
    };

    private static readonly Dictionary<string, string> Responses = new(StringComparer.Ordinal)
    {
        ["listBands"] = """[{"code":"bc-49m","layer":"service","name":"49 m broadcasting","label":"49 m broadcasting, 5900–6200 kHz","segments":[{"lowKhz":5900,"highKhz":6200}]}]""",
        ["getBand"] = """{"code":"bc-49m","layer":"service","name":"49 m broadcasting","label":"49 m broadcasting, 5900–6200 kHz","segments":[{"lowKhz":5900,"highKhz":6200}]}""",
        ["listRegions"] = """[{"code":"baltic","name":"Baltic coast","kind":"locators","locators":["KO","JO"],"stations":["north-hut"]}]""",
        ["getRegion"] = """{"code":"baltic","name":"Baltic coast","kind":"locators","locators":["KO","JO"],"stations":["north-hut"]}""",
        ["createRegion"] = """{"code":"baltic","name":"Baltic coast","kind":"locators","locators":["KO","JO"],"stations":["north-hut"]}""",
        ["listStations"] = $"[{Station}]",
        ["getStation"] = Station,
        ["createStation"] = $$"""{"station":{{Station}},"key":"(the key, shown once)"}""",
        ["addSetup"] = Setup,
        ["listKeys"] = """[{"id":7,"note":"first key","createdAt":"2026-05-01T12:00:00+00:00"}]""",
        ["issueKey"] = """{"id":8,"key":"(the key, shown once)"}""",
        ["putDay"] = Receipt,
        ["postDays"] = Receipt,
        ["getDay"] = SheetJson,
        ["listDays"] = """[{"date":"2026-06-01","revision":1,"checksum":"2c1f0e3b5d7a9c8e0f1a2b3c4d5e6f70","cells":1}]""",
        ["listRevisions"] = """[{"revision":1,"receivedAt":"2026-06-02T00:10:00+00:00","status":"stored","cells":1,"checksum":"2c1f0e3b5d7a9c8e0f1a2b3c4d5e6f70"}]""",
        ["getCoverage"] = """{"from":"2026-06-01","to":"2026-06-30","dates":["2026-06-01"],"stations":["north-hut"],"hours":[[1]],"cells":[[1]],"bands":[[1]],"revision":"9f2c"}""",
        ["getHeatmap"] = $$"""{"measure":"occupancy","unit":"1","stat":"mean","clock":"utc","hours":[{{Hours}}],"bands":["bc-49m"],"values":[[{{Repeat("0.4312")}}]],"stations":[[{{Repeat("1")}}]],"days":[[{{Repeat("1")}}]],"lower":[[{{Repeat("null")}}]],"upper":[[{{Repeat("null")}}]],"revision":"9f2c"}""",
    };

    public static JsonNode? Request(string operation, string type) => operation switch
    {
        "putDay" or "postDays" => type switch
        {
            "text/csv" => operation is "putDay" ? SheetCsv : "date," + SheetCsv.Replace("\n0,", "\n2026-06-01,0,", StringComparison.Ordinal),
            "application/x-ndjson" => SheetJson + "\n",
            _ => JsonNode.Parse(SheetJson),
        },
        _ => Requests.TryGetValue(operation, out var text) ? JsonNode.Parse(text) : null,
    };

    public static JsonNode? Response(string operation, string type) => type switch
    {
        "text/csv" => operation switch
        {
            "getHeatmap" => "band,hour,value,lower,upper,stations,days\nbc-49m,0,0.4312,,,1,1\n",
            "getCoverage" => "station,date,hours,cells,bands,withdrawn\nnorth-hut,2026-06-01,1,1,1,false\n",
            _ => SheetCsv,
        },
        "image/svg+xml" => """<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 900 600"></svg>""",
        "application/x-ndjson" => Receipt + "\n" + """{"date":"2026-06-02","status":"refused","errors":[{"line":3,"field":"occupancy","rule":"share-range","message":"'7' is not a share from 0 to 1."}]}""" + "\n",
        _ => Responses.TryGetValue(operation, out var text) ? JsonNode.Parse(text) : null,
    };

    public static JsonNode? Problem(string status) => JsonSerializer.SerializeToNode(
        Problems.Details(int.Parse(status, System.Globalization.CultureInfo.InvariantCulture), StatusText(status) ?? "", status is "400"
            ? [new(2, "occupancy", SheetRule.ShareRange, "'7' is not a share from 0 to 1.")]
            : []), JsonSerializerOptions.Web);

    public static string? StatusText(string status) => status switch
    {
        "200" => "The answer.",
        "201" => "Created.",
        "204" => "Done.",
        "304" => "The reader has this version already.",
        "400" => "A malformed or contradictory value, or bad content; every error is listed.",
        "401" => "No key, or one that is not known.",
        "403" => "The key is good, but not for this.",
        "404" => "No such station, region, band, day or key.",
        "406" => "None of the asked representations can be made.",
        "409" => "The code is taken.",
        "410" => "The day was withdrawn.",
        "413" => "The body is too large.",
        "415" => "The body's type, charset or encoding is not one of those allowed.",
        "429" => "Too many requests; Retry-After says when to come again.",
        _ => null,
    };

    private static string Repeat(string text) => string.Join(",", Enumerable.Repeat(text, 24));
}
