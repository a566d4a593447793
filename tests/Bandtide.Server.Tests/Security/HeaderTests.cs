using System.Net;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Security;

/// <summary>Response headers: what a browser may do with an answer.</summary>
public sealed class HeaderTests
{
    [Fact]
    public async Task Pages_keep_to_their_own_scripts_and_numbers_need_nothing()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var first = await server.Visitor.GetAsync("/", "text/html");
        using var second = await server.Visitor.GetAsync("/", "text/html");
        var policy = Header(first, "Content-Security-Policy");
        Assert.Contains("default-src 'self'", policy, StringComparison.Ordinal);
        Assert.Contains("script-src 'self' 'nonce-", policy, StringComparison.Ordinal);
        Assert.DoesNotContain("unsafe-eval", policy, StringComparison.Ordinal);
        Assert.NotEqual(policy, Header(second, "Content-Security-Policy"));
        using var bands = await server.Visitor.GetAsync("bands", null);
        Assert.Equal("default-src 'none'; frame-ancestors 'none'", Header(bands, "Content-Security-Policy"));
        foreach (var response in new[] { first, bands })
        {
            Assert.Equal("nosniff", Header(response, "X-Content-Type-Options"));
            Assert.Equal("same-origin", Header(response, "Referrer-Policy"));
            Assert.False(response.Headers.Contains("Server"));
        }
    }

    [Theory]
    [InlineData("bands")]
    [InlineData("stations/north")]
    [InlineData("heatmap?station=north&month=2026-01")]
    [InlineData("heatmap?station=north&month=2026-01&format=svg")]
    [InlineData("coverage?station=nobody&month=2026-01")]
    [InlineData("/openapi/v1.json")]
    public async Task Other_sites_may_read(string path)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        server.Visitor.DefaultRequestHeaders.Add("Origin", "https://club.example");
        using var response = await server.Visitor.GetAsync(path, null);
        Assert.Equal("*", Header(response, "Access-Control-Allow-Origin"));
        Assert.False(response.Headers.Contains("Access-Control-Allow-Credentials"));
    }

    [Fact]
    public async Task Other_sites_may_not_write()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var request = new HttpRequestMessage(HttpMethod.Options, "stations/north/days/2026-01-01");
        request.Headers.Add("Origin", "https://club.example");
        request.Headers.Add("Access-Control-Request-Method", "PUT");
        using var response = await server.Visitor.SendAsync(request, Ct);
        Assert.False(response.Headers.TryGetValues("Access-Control-Allow-Methods", out var methods) && methods.Any(method => method.Contains("PUT", StringComparison.Ordinal)));
    }

    [Fact]
    public async Task Headers_may_be_asked_for_alone()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        foreach (var path in new[] { "bands", "stations/north", "heatmap?station=north&month=2026-01" })
        {
            using var get = await server.Visitor.GetAsync(path, null);
            using var head = await server.Visitor.SendAsync(new(HttpMethod.Head, path), Ct);
            Assert.Equal(HttpStatusCode.OK, head.StatusCode);
            Assert.Equal(get.Headers.ETag, head.Headers.ETag);
            Assert.Equal(get.Content.Headers.ContentType, head.Content.Headers.ContentType);
            Assert.Empty(await head.Content.ReadAsByteArrayAsync(Ct));
        }
    }

    [Fact]
    public async Task A_method_that_an_address_does_not_know_names_those_it_does()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        using var response = await server.Visitor.DeleteAsync(new Uri("bands", UriKind.Relative), Ct);
        await response.ProblemAsync(HttpStatusCode.MethodNotAllowed);
        Assert.Contains("GET", response.Content.Headers.Allow);
    }

    // The framework adds a second policy of its own to pages; a browser obeys both.
    private static string Header(HttpResponseMessage response, string name) => response.Headers.GetValues(name).First();
}
