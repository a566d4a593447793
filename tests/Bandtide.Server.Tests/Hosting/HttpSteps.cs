using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json.Nodes;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>What most tests do over HTTP, in one line each.</summary>
internal static class HttpSteps
{
    public static CancellationToken Ct => TestContext.Current.CancellationToken;

    public static async Task<JsonNode> JsonAsync(this HttpResponseMessage response) =>
        JsonNode.Parse(await response.Content.ReadAsStringAsync(Ct)) ?? throw new InvalidOperationException("The answer is null.");

    public static StringContent Body(string text, string type = "text/csv") => new(text, Encoding.UTF8, type);

    public static Task<HttpResponseMessage> PutDayAsync(this HttpClient client, string station, string date, string csv) =>
        client.PutAsync(new Uri($"stations/{station}/days/{date}", UriKind.Relative), Body(csv), Ct);

    /// <summary>Sends many days and returns the answer's lines.</summary>
    public static async Task<IReadOnlyList<JsonNode>> PostDaysAsync(this HttpClient client, string station, string body, string type = "text/csv", string query = "")
    {
        using var response = await client.PostAsync(new Uri($"stations/{station}/days{query}", UriKind.Relative), Body(body, type), Ct);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        return Lines(await response.Content.ReadAsStringAsync(Ct));
    }

    public static IReadOnlyList<JsonNode> Lines(string text) =>
        [.. text.Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(line => JsonNode.Parse(line)!)];

    public static async Task<HttpResponseMessage> GetAsync(this HttpClient client, string path, string? accept, string? ifNoneMatch = null)
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, path);
        if (accept is not null)
        {
            request.Headers.TryAddWithoutValidation("Accept", accept);
        }

        if (ifNoneMatch is not null)
        {
            request.Headers.IfNoneMatch.Add(EntityTagHeaderValue.Parse(ifNoneMatch));
        }

        return await client.SendAsync(request, Ct);
    }

    /// <summary>Asserts problem details of a status and returns their errors as (line, field, rule).</summary>
    public static async Task<IReadOnlyList<(int Line, string Field, string Rule)>> ProblemAsync(this HttpResponseMessage response, HttpStatusCode status)
    {
        Assert.Equal(status, response.StatusCode);
        Assert.Equal("application/problem+json", response.Content.Headers.ContentType?.MediaType);
        var problem = await response.JsonAsync();
        Assert.Equal((int)status, problem["status"]!.GetValue<int>());
        Assert.NotEmpty(problem["detail"]!.GetValue<string>());
        return [.. problem["errors"]!.AsArray().Select(error => (error!["line"]!.GetValue<int>(), error["field"]!.GetValue<string>(), error["rule"]!.GetValue<string>()))];
    }
}
