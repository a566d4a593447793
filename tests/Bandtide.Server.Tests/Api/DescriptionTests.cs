using System.Net;
using System.Text.Json.Nodes;
using System.Text.RegularExpressions;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using Microsoft.AspNetCore.Routing;
using Microsoft.Extensions.DependencyInjection;
using Microsoft.OpenApi;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>The OpenAPI document: complete, valid, and true.</summary>
public sealed partial class DescriptionTests
{
    private static readonly string[] Methods = ["get", "put", "post", "delete"];

    [Fact]
    public async Task The_document_is_valid_openapi_3_1()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var response = await server.Visitor.GetAsync("/openapi/v1.json", null);
        var text = await response.Content.ReadAsStringAsync(Ct);
        Assert.StartsWith("3.1.", JsonNode.Parse(text)!["openapi"]!.GetValue<string>(), StringComparison.Ordinal);

        // The reader and rules of Microsoft.OpenApi, which implement OAI/OpenAPI-Specification 3.1.
        var read = OpenApiDocument.Parse(text, "json");
        Assert.Empty(read.Diagnostic!.Errors);
        Assert.Empty(read.Diagnostic.Warnings);
        Assert.Empty(read.Document!.Validate(ValidationRuleSet.GetDefaultRuleSet()));
    }

    [Fact]
    public async Task Every_call_is_described_and_nothing_else()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var mapped = server.Services.GetServices<EndpointDataSource>().SelectMany(source => source.Endpoints).OfType<RouteEndpoint>()
            .Where(endpoint => endpoint.RoutePattern.RawText?.StartsWith("/api/", StringComparison.Ordinal) == true)
            .SelectMany(endpoint => endpoint.Metadata.GetMetadata<IHttpMethodMetadata>()!.HttpMethods.Select(method => $"{method} {endpoint.RoutePattern.RawText}"));
        var described = (await DocumentAsync(server))["paths"]!.AsObject().SelectMany(path => path.Value!.AsObject().Select(call => $"{call.Key.ToUpperInvariant()} {path.Key}"));
        Assert.Equal(mapped.Order(StringComparer.Ordinal), described.Order(StringComparer.Ordinal));
    }

    [Fact]
    public async Task Every_call_has_words_examples_and_every_refusal()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var missing = new List<string>();
        var ids = new HashSet<string>(StringComparer.Ordinal);
        foreach (var (name, call) in await CallsAsync(server))
        {
            void Need(bool there, string what)
            {
                if (!there)
                {
                    missing.Add($"{name}: {what}");
                }
            }

            Need(call["summary"] is not null, "summary");
            Need(call["tags"]?.AsArray().Count == 1, "tag");
            Need(ids.Add(call["operationId"]!.GetValue<string>()), "an identity of its own");
            foreach (var parameter in call["parameters"]?.AsArray() ?? [])
            {
                var schema = parameter!["schema"];
                Need(parameter["description"] is not null, $"description of {parameter["name"]}");
                Need(parameter["example"] is not null || schema?["enum"] is not null || schema?["default"] is not null, $"example of {parameter["name"]}");
            }

            foreach (var (type, media) in call["requestBody"]?["content"]?.AsObject() ?? [])
            {
                Need(media!["example"] is not null && media["schema"] is not null, $"example and schema of the body as {type}");
            }

            var responses = call["responses"]!.AsObject();
            Need(responses.ContainsKey("401") && responses.ContainsKey("429"), "401 and 429: a key is judged on every call");
            Need(call["security"] is null == !responses.ContainsKey("403"), "403 where a key is needed");
            foreach (var (status, response) in responses)
            {
                Need(response!["description"]!.GetValue<string>().Length > 0, $"description of {status}");
                Need(status is "204" or "304" || response["content"] is JsonObject { Count: > 0 }, $"content of {status}");
                foreach (var (type, media) in response["content"]?.AsObject() ?? [])
                {
                    Need(media!["example"] is not null && media["schema"] is not null, $"example and schema of {status} as {type}");
                    Need(status[0] is '2' == type is not "application/problem+json", $"the type of {status}");
                }
            }
        }

        Assert.Empty(missing);
    }

    // As printed: whoever copies an example into a client gets what is promised.
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Examples_of_bodies_are_accepted_and_answers_have_the_members_of_their_examples(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        var calls = (await CallsAsync(server)).ToDictionary(call => call.Call["operationId"]!.GetValue<string>(), StringComparer.Ordinal);
        foreach (var id in new[] { "createStation", "createRegion", "addSetup", "putDay", "postDays", "issueKey" })
        {
            var (name, call) = calls[id];
            foreach (var (type, media) in call["requestBody"]?["content"]?.AsObject() ?? new JsonObject { ["none"] = new JsonObject() })
            {
                var example = media!["example"];
                using var request = new HttpRequestMessage(new(name.Split(' ')[0].ToUpperInvariant()), Filled(name.Split(' ')[1]));
                request.Content = type is "none" ? null : Body(example is JsonValue text ? text.GetValue<string>() : example!.ToJsonString(), type);
                using var response = await server.Coordinator.SendAsync(request, Ct);
                Assert.True(response.IsSuccessStatusCode, $"{name} as {type}: {await response.Content.ReadAsStringAsync(Ct)}");
                foreach (var line in Lines(await response.Content.ReadAsStringAsync(Ct)))
                {
                    Assert.NotEqual("refused", line["status"]?.ToString());
                    SameMembers(id, Example(call, "201", "application/json") ?? Example(call, "200", "application/json"), line);
                }
            }
        }

        foreach (var (id, (name, call)) in calls.Where(call => call.Value.Name.StartsWith("get ", StringComparison.Ordinal)))
        {
            var query = id switch { "getHeatmap" or "getCoverage" => "?region=all&month=2026-06", _ => "" };
            using var response = await server.Coordinator.GetAsync(Filled(name.Split(' ')[1]) + query, null);
            Assert.True(response.StatusCode == HttpStatusCode.OK, $"{name}: {response.StatusCode}");
            SameMembers(id, Example(call, "200", "application/json"), await response.JsonAsync());
        }
    }

    [Fact]
    public async Task Errors_look_like_their_example()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var (_, call) = (await CallsAsync(server)).Single(call => call.Call["operationId"]!.GetValue<string>() is "getStation");
        foreach (var (path, status) in new[] { ("stations/nobody", "404"), ("stations/NOBODY", "400") })
        {
            SameMembers(status, Example(call, status, "application/problem+json"), await (await server.Visitor.GetAsync(path, null)).JsonAsync());
        }
    }

    // What an outsider sees of the page behind "API reference": nothing comes from elsewhere.
    [Fact]
    public async Task The_readable_page_tells_every_call_and_needs_no_other_host()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var page = await server.Visitor.GetAsync("/reference", "text/html");
        Assert.Equal(HttpStatusCode.OK, page.StatusCode);
        var html = await page.Content.ReadAsStringAsync(Ct);
        Assert.Contains("openapi/v1.json", html, StringComparison.Ordinal);
        Assert.All(await CallsAsync(server), call => Assert.Contains(call.Call["summary"]!.GetValue<string>(), WebUtility.HtmlDecode(html), StringComparison.Ordinal));
        var sources = Source().Matches(html).Select(match => match.Groups["source"].Value).ToList();
        Assert.NotEmpty(sources);
        foreach (var source in sources)
        {
            Assert.DoesNotContain("//", source, StringComparison.Ordinal);
            Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync(new Uri(page.RequestMessage!.RequestUri!, source), Ct)).StatusCode);
        }

        var nonce = Nonce().Match(page.Headers.GetValues("Content-Security-Policy").First()).Groups["nonce"].Value;
        Assert.NotEmpty(nonce);
        Assert.All(InlineScript().Matches(html), script => Assert.Contains($"nonce=\"{nonce}\"", WebUtility.HtmlDecode(script.Value), StringComparison.Ordinal));
    }

    [GeneratedRegex("src=[\"'](?<source>[^\"']+)[\"']", RegexOptions.None, 1000)]
    private static partial Regex Source();

    [GeneratedRegex("'nonce-(?<nonce>[^']+)'", RegexOptions.None, 1000)]
    private static partial Regex Nonce();

    [GeneratedRegex("<script(?![^>]*src=)[^>]*>", RegexOptions.None, 1000)]
    private static partial Regex InlineScript();

    private static async Task<JsonNode> DocumentAsync(ServerHost server) => await (await server.Visitor.GetAsync("/openapi/v1.json", null)).JsonAsync();

    private static async Task<IReadOnlyList<(string Name, JsonNode Call)>> CallsAsync(ServerHost server)
    {
        var calls = (await DocumentAsync(server))["paths"]!.AsObject()
            .SelectMany(path => path.Value!.AsObject().Where(call => Methods.Contains(call.Key, StringComparer.Ordinal)).Select(call => ($"{call.Key} {path.Key}", call.Value!)))
            .ToList();
        Assert.NotEmpty(calls);
        return calls;
    }

    private static JsonNode? Example(JsonNode call, string status, string type) => call["responses"]?[status]?["content"]?[type]?["example"];

    private static string Filled(string path) => path
        .Replace("/bands/{code}", "/bands/bc-49m", StringComparison.Ordinal)
        .Replace("/regions/{code}", "/regions/baltic", StringComparison.Ordinal)
        .Replace("{code}", "north-hut", StringComparison.Ordinal)
        .Replace("{date}", "2026-06-01", StringComparison.Ordinal);

    private static void SameMembers(string place, JsonNode? example, JsonNode? real)
    {
        switch (example, real)
        {
            case (JsonObject expected, JsonObject got):
                // A note is there only when there is something to say.
                Assert.Equal(expected.Select(entry => entry.Key).Order(StringComparer.Ordinal), got.Select(entry => entry.Key).Where(name => name is not "note" || expected.ContainsKey(name)).Order(StringComparer.Ordinal));
                foreach (var (name, value) in expected)
                {
                    SameMembers($"{place}.{name}", value, got[name]);
                }

                break;
            case (JsonArray { Count: > 0 } expected, JsonArray { Count: > 0 } got):
                SameMembers($"{place}[]", expected[0], got[0]);
                break;
            case (JsonArray, JsonArray) or (null, _) or (_, null):
                break;
            default:
                Assert.True(example!.GetValueKind() == real!.GetValueKind() || example is JsonValue && real is JsonValue, $"{place}: {example.GetValueKind()} and {real.GetValueKind()}");
                break;
        }
    }
}
