using System.Net;
using System.Text.RegularExpressions;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>The first start without a coordinator: a link that works once.</summary>
public sealed partial class FirstCoordinatorTests
{
    [Fact]
    public async Task The_printed_link_makes_one_key_and_is_used_up()
    {
        using var folder = new TemporaryFolder();
        await using (var server = await ServerProcess.ListenAsync(folder.Path, []))
        {
            var link = new Uri((await server.LineAsync(line => line.Contains("/setup/", StringComparison.Ordinal))).Split(' ')[^1]);
            Assert.Equal(server.Address.Port, link.Port);
            using var browser = new HttpClient();
            Assert.Equal(HttpStatusCode.NotFound, (await browser.GetAsync(new Uri(server.Address, "/setup/guessed"), Ct)).StatusCode);

            var page = await browser.GetStringAsync(link, Ct);
            var field = Field().Match(page);
            var form = new Dictionary<string, string>(StringComparer.Ordinal) { [field.Groups["name"].Value] = WebUtility.HtmlDecode(field.Groups["value"].Value) };
            using (var without = await browser.PostAsync(link, new FormUrlEncodedContent([]), Ct))
            {
                Assert.Equal(HttpStatusCode.BadRequest, without.StatusCode);
            }

            using (var unreadable = await browser.PostAsync(link, Body("--x\r\nnonsense", "multipart/form-data"), Ct))
            {
                Assert.Equal(HttpStatusCode.BadRequest, unreadable.StatusCode);
            }

            using var other = new HttpClient();
            using (var foreign = await other.PostAsync(link, new FormUrlEncodedContent(form), Ct))
            {
                Assert.Equal(HttpStatusCode.BadRequest, foreign.StatusCode);
            }

            using var made = await browser.PostAsync(link, new FormUrlEncodedContent(form), Ct);
            Assert.Equal(HttpStatusCode.OK, made.StatusCode);
            var key = WebUtility.HtmlDecode(Code().Match(await made.Content.ReadAsStringAsync(Ct)).Groups["key"].Value);
            Assert.True(made.Headers.CacheControl?.NoStore, "The page that shows the key must not be kept.");
            using var client = server.Client(key);
            using var station = await client.PostAsync(new Uri("stations", UriKind.Relative), Body("""{"code":"north","name":"N","latitude":1,"longitude":2,"levelUnit":"dBm"}""", "application/json"), Ct);
            Assert.Equal(HttpStatusCode.Created, station.StatusCode);

            Assert.Equal(HttpStatusCode.NotFound, (await browser.GetAsync(link, Ct)).StatusCode);
            Assert.Equal(HttpStatusCode.NotFound, (await browser.PostAsync(link, new FormUrlEncodedContent(form), Ct)).StatusCode);
            Assert.DoesNotContain(key, server.Errors, StringComparison.Ordinal);
            Assert.Equal(0, await server.StopAsync());
        }

        // There is a coordinator now: a second start prints no link.
        await using var again = await ServerProcess.ListenAsync(folder.Path, []);
        Assert.Equal(0, await again.StopAsync());
        Assert.DoesNotContain("/setup/", await again.RestAsync(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_configured_key_is_a_coordinators_and_no_link_is_printed()
    {
        using var folder = new TemporaryFolder();
        await using var server = await ServerProcess.ListenAsync(folder.Path, [("Setup__CoordinatorKey", ServerHost.CoordinatorKey)]);
        using var client = server.Client();
        Assert.Equal(HttpStatusCode.BadRequest, (await client.PostAsync(new Uri("stations", UriKind.Relative), Body("{}", "application/json"), Ct)).StatusCode);
        Assert.Equal(0, await server.StopAsync());
        var said = await server.RestAsync();
        Assert.DoesNotContain("/setup/", said, StringComparison.Ordinal);
        Assert.DoesNotContain(ServerHost.CoordinatorKey, said + server.Errors, StringComparison.Ordinal);
    }

    [GeneratedRegex("name=\"(?<name>[^\"]+)\" value=\"(?<value>[^\"]+)\"", RegexOptions.None, 1000)]
    private static partial Regex Field();

    [GeneratedRegex("<code>(?<key>[^<]+)</code>", RegexOptions.None, 1000)]
    private static partial Regex Code();
}
