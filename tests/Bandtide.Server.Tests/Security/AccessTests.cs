using System.Net;
using System.Net.Http.Headers;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Security;

/// <summary>Who may do what.</summary>
public sealed class AccessTests
{
    private const string Day = "hour,band,sweeps,occupancy\n0,bc-49m,1,0\n";
    private const string Setup = """{"validFrom":"2026-01-01"}""";

    // In the order: nobody, an unknown key, another station's key, the station's own key, a coordinator's.
    [Theory]
    [InlineData("GET", "bands", null, null, "200 401 200 200 200")]
    [InlineData("GET", "stations/north", null, null, "200 401 200 200 200")]
    [InlineData("GET", "regions", null, null, "200 401 200 200 200")]
    [InlineData("GET", "stations/north/days", null, null, "200 401 200 200 200")]
    [InlineData("GET", "stations/north/days/2026-01-01", null, null, "200 401 200 200 200")]
    [InlineData("GET", "stations/north/days/2026-01-01/revisions", null, null, "200 401 200 200 200")]
    [InlineData("GET", "heatmap?station=north&month=2026-01", null, null, "200 401 200 200 200")]
    [InlineData("GET", "coverage?station=north&month=2026-01", null, null, "200 401 200 200 200")]
    [InlineData("GET", "no/such/address", null, null, "404 401 404 404 404")]
    [InlineData("PATCH", "stations", null, null, "405 401 405 405 405")]
    [InlineData("GET", "stations/north/keys", null, null, "401 401 403 200 200")]
    [InlineData("POST", "stations/north/keys", "", null, "401 401 403 201 201")]
    [InlineData("DELETE", "stations/north/keys/999999", null, null, "401 401 403 404 404")]
    [InlineData("POST", "stations/north/setups", Setup, "application/json", "401 401 403 201 201")]
    [InlineData("PUT", "stations/north/days/2026-01-01", Day, "text/csv", "401 401 403 200 200")]
    [InlineData("POST", "stations/north/days", "date," + Day, "text/csv", "401 401 403 200 200")]
    [InlineData("DELETE", "stations/north/days/2025-01-01", null, null, "401 401 403 404 404")]
    [InlineData("PUT", "stations/nowhere/days/2026-01-01", Day, "text/csv", "401 401 404 404 404")]
    [InlineData("POST", "stations", "{}", "application/json", "401 401 403 403 400")]
    [InlineData("POST", "regions", "{}", "application/json", "401 401 403 403 400")]
    public async Task Each_call_is_open_to_those_it_is_meant_for(string method, string path, string? body, string? type, string expected)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var own = await server.AddStationAsync("north");
        var other = await server.AddStationAsync("south", -30);
        await server.Coordinator.PutDayAsync("north", "2026-01-01", Day);
        var statuses = new List<string>();
        foreach (var key in new[] { null, "unknown-key-unknown-key-unknown-key-123", other, own, ServerHost.CoordinatorKey })
        {
            using var client = server.Client(key);
            using var request = new HttpRequestMessage(new(method), path) { Content = body is null ? null : new StringContent(body, new MediaTypeHeaderValue(type ?? "text/plain")) };
            using var response = await client.SendAsync(request, Ct);
            statuses.Add(((int)response.StatusCode).ToString(System.Globalization.CultureInfo.InvariantCulture));
            if (!response.IsSuccessStatusCode)
            {
                await response.ProblemAsync(response.StatusCode);
            }

            Assert.Equal(response.StatusCode == HttpStatusCode.Unauthorized, response.Headers.WwwAuthenticate.Any(challenge => challenge.Scheme is "Bearer"));
        }

        Assert.Equal(expected, string.Join(" ", statuses));
    }

    [Theory]
    [InlineData("Basic dXNlcjpwYXNz")]
    [InlineData("Bearer")]
    [InlineData("Bearer ")]
    [InlineData("Bearer two words")]
    [InlineData("coordinator-key-of-the-tests-0123456789")]
    public async Task A_header_that_is_no_good_key_is_401_on_reads_too(string header)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var request = new HttpRequestMessage(HttpMethod.Get, "bands");
        request.Headers.TryAddWithoutValidation("Authorization", header);
        await (await server.Visitor.SendAsync(request, Ct)).ProblemAsync(HttpStatusCode.Unauthorized);
    }

    [Fact]
    public async Task The_word_bearer_may_be_written_in_any_case()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var request = new HttpRequestMessage(HttpMethod.Get, "bands");
        request.Headers.TryAddWithoutValidation("Authorization", $"bearer {ServerHost.CoordinatorKey}");
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.SendAsync(request, Ct)).StatusCode);
    }

    // A key for this machine alone: a request that came through a proxy comes from elsewhere.
    [Theory]
    [InlineData(null, HttpStatusCode.Created)]
    [InlineData("X-Forwarded-For", HttpStatusCode.Unauthorized)]
    [InlineData("Forwarded", HttpStatusCode.Unauthorized)]
    [InlineData("X-Real-IP", HttpStatusCode.Unauthorized)]
    [InlineData("Via", HttpStatusCode.Unauthorized)]
    public async Task A_loopback_key_is_good_without_a_proxy_only(string? header, HttpStatusCode status)
    {
        const string key = "loopback-key-of-the-tests-0123456789";
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var station = (await server.Store.Network.GetAsync(Ct)).FindStation("north")!;
        await server.Store.Keys.EnsureAsync(key, station.Id, loopbackOnly: true, "demonstration", Ct);
        using var client = server.Client(key);
        if (header is not null)
        {
            client.DefaultRequestHeaders.TryAddWithoutValidation(header, header is "Forwarded" ? "for=192.0.2.7" : header is "Via" ? "1.1 proxy" : "127.0.0.1");
        }

        Assert.Equal(status, (await client.PutDayAsync("north", "2026-01-01", Day)).StatusCode);
    }

    [Fact]
    public async Task A_key_that_is_used_too_fast_is_told_when_to_come_again_and_no_other_is()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite, settings: [("RateLimits:KeyPerSecond", "1"), ("RateLimits:KeyBurst", "5")]);
        using var station = server.Client(await server.AddStationAsync("north"));
        var statuses = new List<HttpStatusCode>();
        TimeSpan? wait = null;
        for (var i = 0; i < 20; i++)
        {
            using var response = await station.GetAsync(new Uri("bands", UriKind.Relative), Ct);
            statuses.Add(response.StatusCode);
            if (response.StatusCode == HttpStatusCode.TooManyRequests)
            {
                wait = response.Headers.RetryAfter?.Delta;
                await response.ProblemAsync(HttpStatusCode.TooManyRequests);
            }
        }

        Assert.All(statuses.Take(5), status => Assert.Equal(HttpStatusCode.OK, status));
        Assert.Contains(HttpStatusCode.TooManyRequests, statuses);
        Assert.True(wait >= TimeSpan.FromSeconds(1));
        Assert.Equal(HttpStatusCode.OK, (await server.Coordinator.GetAsync(new Uri("bands", UriKind.Relative), Ct)).StatusCode);
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync(new Uri("bands", UriKind.Relative), Ct)).StatusCode);
        await Task.Delay(wait!.Value + TimeSpan.FromSeconds(1), Ct);
        Assert.Equal(HttpStatusCode.OK, (await station.GetAsync(new Uri("bands", UriKind.Relative), Ct)).StatusCode);
    }

    [Fact]
    public async Task Refused_keys_are_counted_by_address_and_good_ones_are_not()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite, settings: [("RateLimits:FailuresPerSecond", "1"), ("RateLimits:FailureBurst", "3")]);
        using var guesser = server.Client("a-guess-a-guess-a-guess-a-guess-a-guess");
        var statuses = new List<HttpStatusCode>();
        for (var i = 0; i < 15; i++)
        {
            statuses.Add((await guesser.GetAsync(new Uri("bands", UriKind.Relative), Ct)).StatusCode);
        }

        Assert.All(statuses.Take(3), status => Assert.Equal(HttpStatusCode.Unauthorized, status));
        Assert.Contains(HttpStatusCode.TooManyRequests, statuses);
        for (var i = 0; i < 30; i++)
        {
            Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync(new Uri("bands", UriKind.Relative), Ct)).StatusCode);
            Assert.Equal(HttpStatusCode.OK, (await server.Coordinator.GetAsync(new Uri("bands", UriKind.Relative), Ct)).StatusCode);
        }
    }

    [Fact]
    public async Task Keys_are_kept_as_hashes_alone()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var key = await server.AddStationAsync("north");
        foreach (var file in Directory.GetFiles(server.Store.Options.DataDirectory, "*", SearchOption.AllDirectories))
        {
            await using var stream = new FileStream(file, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
            using var copy = new MemoryStream();
            await stream.CopyToAsync(copy, Ct);
            var bytes = copy.ToArray();
            Assert.False(bytes.AsSpan().IndexOf(System.Text.Encoding.UTF8.GetBytes(key)) >= 0, $"The station's key stands in {file}.");
            Assert.False(bytes.AsSpan().IndexOf(System.Text.Encoding.UTF8.GetBytes(ServerHost.CoordinatorKey)) >= 0, $"The coordinator's key stands in {file}.");
        }

        Assert.Equal(2L, Convert.ToInt64(await server.Store.SqlAsync("SELECT count(*) FROM access_key"), System.Globalization.CultureInfo.InvariantCulture));
        Assert.Single(JsonNode.Parse(await (await server.Coordinator.GetAsync("stations/north/keys", null)).Content.ReadAsStringAsync(Ct))!.AsArray());
    }
}
