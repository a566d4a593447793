using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using CsCheck;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>Thousands of bodies that nobody should send: refused or stored, never a fault of the server.</summary>
public sealed class HostileBodyTests
{
    private const string Good = "hour,band,sweeps,occupancy,signal,level,level_p90,floor,steady,coverage\n0,bc-49m,720,0.4312,-78.60,-96.10,-70.35,-98.40,0.02,1\n";
    private const string GoodJson = """{"date":"2026-06-01","cells":[{"hour":0,"band":"bc-49m","sweeps":720,"occupancy":0.4312,"levelP90":null}]}""";

    private static Gen<T> Pick<T>(params T[] values) => Gen.Int[0, values.Length - 1].Select(i => values[i]);

    private static readonly string[] Words =
    [
        ",", ",", "\n", "\r\n", "\r", "\"", "\"\"", ";", "\t", " ", "\0", "\uFEFF", "é", "\u2028", "😀", "hour", "band", "sweeps", "occupancy", "date", "level_p90",
        "2026-06-01", "2026-06-02", "2026-02-30", "9999-12-31", "0001-01-01", "0", "23", "24", "-1", "1e308", "1e-999", "1E+5", "NaN", "Infinity", "-0", "0.00005",
        "99999999999999999999999999", ".", "+1", "0x10", "bc-49m", "mhz-00", "mhz-29", "{", "}", "[", "]", ":", "\"cells\"", "\"date\":\"2026-06-01\"", "\"hour\":0",
        "\"band\":\"bc-49m\"", "\"sweeps\":1", "\"occupancy\":0.5", "\\ud800", "\\u0000", "null", "true", "[[[[[[[[[[[[[[[[[[[[", "//", "<xml/>", new('x', 5000), new('9', 400), new(',', 3000),
    ];

    private static readonly string[] Types =
        ["text/csv", "application/json", "application/x-ndjson", "text/csv; charset=utf-8", "application/json; charset=\"UTF-8\"", "text/csv; header=present", "text/plain", "TEXT/CSV", "text/csv; charset=utf-16", "*/*"];

    // Words in any order; a good body with bytes changed; bytes of chance.
    private static readonly Gen<byte[]> Bytes = Gen.OneOf(
        Pick(Words).Array[0, 60].Select(words => Encoding.UTF8.GetBytes(string.Concat(words))),
        Gen.Select(Pick(Good, GoodJson, "date," + Good.Replace("\n0", "\n2026-06-01,0", StringComparison.Ordinal), GoodJson + "\n" + GoodJson), Gen.Select(Gen.Int[0, 300], Gen.Byte).Array[1, 6])
            .Select((text, changes) => Changed(Encoding.UTF8.GetBytes(text), changes)),
        Gen.Select(Pick(Good, GoodJson), Pick(Words), Gen.Int[0, 200]).Select((text, word, place) => Encoding.UTF8.GetBytes(text.Insert(Math.Min(place, text.Length), word))),
        Gen.Byte.Array[0, 300]);

    private static readonly Gen<(byte[] Body, string Type, bool Bulk, int Packing, string Accept)> Requests = Gen.Select(
        Bytes, Pick(Types), Gen.Bool, Gen.Int[0, 9], Pick("*/*", "application/json", "application/x-ndjson", "text/csv", "application/*;q=0.5", "nonsense", "*/*;q=0"));

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task No_body_makes_the_server_fail_or_harms_the_store(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await server.AddStationAsync("north");
        var (answers, stored) = (0, 0);
        await Requests.SampleAsync(
            async request =>
            {
                using var message = Message(request.Body, request.Type, request.Bulk, request.Packing, request.Accept);
                using var response = await server.Coordinator.SendAsync(message, Ct);
                var text = await response.Content.ReadAsStringAsync(Ct);
                Assert.True((int)response.StatusCode is 200 or 201 or 400 or 406 or 413 or 415, $"{(int)response.StatusCode}: {text}");
                Interlocked.Increment(ref answers);
                if (response.StatusCode is HttpStatusCode.OK or HttpStatusCode.Created)
                {
                    Assert.All(Lines(text), line => Assert.NotNull(line["status"]));
                    Interlocked.Add(ref stored, text.Contains("\"refused\"", StringComparison.Ordinal) || text.Length == 0 ? 0 : 1);
                }
                else
                {
                    Assert.Equal("application/problem+json", response.Content.Headers.ContentType?.MediaType);
                    Assert.Equal((int)response.StatusCode, JsonNode.Parse(text)!["status"]!.GetValue<int>());
                }
            },
            iter: 2500, threads: 2);

        // Some are good by chance: the generator must reach both sides.
        Assert.True(answers >= 2500);
        Assert.InRange(stored, 1, answers - 1);
        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    // Objects of the small calls: stations, regions, setups.
    [Fact]
    public async Task No_object_makes_the_server_fail()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        string[] starts =
        [
            """{"code":"south","name":"South","latitude":1,"longitude":2,"levelUnit":"dBm","regions":["itu-1"]}""",
            """{"code":"list-1","name":"List","stations":["north"]}""",
            """{"code":"list-2","name":"List","locators":["KO","JO33"]}""",
            """{"validFrom":"2026-01-01","threshold":"fixed","marginDb":5,"averages":8,"detector":"power","resolutionHz":1000,"note":"x"}""",
        ];
        string[] values = ["null", "1e400", "-1", "\"\"", "\"\\ud800\"", "\"\\u0000\"", "[]", "[null]", "{}", "true", "\"" + new string('x', 3000) + "\"", "[[\"a\"]]", "\"NaN\"", "1.5", "99999999999", "\"é\"", "\"0000-00-00\"", ""];
        var bodies = from start in Pick(starts)
                     from part in Gen.Int[0, 12]
                     from value in Pick(values)
                     from path in Pick("stations", "regions", "stations/north/setups")
                     select (path, body: WithValue(start, part, value));
        await bodies.SampleAsync(
            async request =>
            {
                using var response = await server.Coordinator.PostAsync(new Uri(request.path, UriKind.Relative), Body(request.body, "application/json"), Ct);
                Assert.True((int)response.StatusCode is 201 or 400 or 409, $"{(int)response.StatusCode} for {request.body}");
            },
            iter: 1500, threads: 2);
    }

    // Addresses of chance: nothing under /api fails, whatever stands in path and query.
    [Fact]
    public async Task No_address_makes_the_server_fail()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        string[] parts = ["bands", "regions", "stations", "north", "days", "2026-06-01", "revisions", "keys", "1", "heatmap", "coverage", "%00", "..", "%2e%2e", "%ff", "é", "a b", "-", new('x', 300), "99999999999999999999", "%2F", "'; DROP TABLE station;--"];
        string[] names = ["region", "station", "month", "from", "to", "season", "years", "measure", "stat", "clock", "layer", "adjust", "interval", "align", "vote", "mindays", "minsweeps", "format", "revision", "x"];
        string[] values = ["all", "north", "2026-06", "0000-00", "9999-12", "winter", "2024..2026", "2026..2024", "..", "excess", "median", "solar", "slice", "none", "square", "1", "-1", "99999999999999", "", "%00", "%ff", "csv", "svg", "é", "json,csv"];
        var addresses = Gen.Select(
            Pick(parts).Array[1, 5],
            Gen.Select(Pick(names), Pick(values)).Array[0, 6],
            (path, query) => $"{string.Join('/', path)}?{string.Join('&', query.Select(pair => $"{pair.Item1}={pair.Item2}"))}");
        await addresses.SampleAsync(
            async address =>
            {
                using var response = await server.Visitor.GetAsync(address, null);
                Assert.True((int)response.StatusCode is 200 or 400 or 401 or 404 or 405 or 410, $"{(int)response.StatusCode} for {address}");
            },
            iter: 3000, threads: 2);
    }

    private static HttpRequestMessage Message(byte[] body, string type, bool bulk, int packing, string accept)
    {
        var content = new ByteArrayContent(packing == 0 ? SampleBodies.Gzip(Encoding.Latin1.GetString(body)) : body);
        content.Headers.TryAddWithoutValidation("Content-Type", type);
        if (packing is 0 or 1)
        {
            content.Headers.ContentEncoding.Add("gzip");
        }

        var message = new HttpRequestMessage(bulk ? HttpMethod.Post : HttpMethod.Put, bulk ? "stations/north/days" : "stations/north/days/2026-06-01") { Content = content };
        message.Headers.TryAddWithoutValidation("Accept", accept);
        return message;
    }

    private static byte[] Changed(byte[] bytes, (int Place, byte Value)[] changes)
    {
        foreach (var (place, value) in changes)
        {
            bytes[place % bytes.Length] = value;
        }

        return bytes;
    }

    // The text with its n-th value (what follows a colon) replaced.
    private static string WithValue(string text, int part, string value)
    {
        var pieces = text.Split(':');
        if (part == 0 || part >= pieces.Length)
        {
            return text;
        }

        var end = pieces[part].LastIndexOfAny([',', '}']);
        pieces[part] = value + (end < 0 ? "" : pieces[part][end..]);
        return string.Join(':', pieces);
    }
}
