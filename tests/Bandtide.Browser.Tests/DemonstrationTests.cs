using System.Net.Http.Headers;
using Bandtide.Browser.Tests.Screens;
using Bandtide.Browser.Tests.Site;
using Bandtide.Server.Demo;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests;

/// <summary>The demonstration as a newcomer meets it. Takes the README's picture; <c>BANDTIDE_SCREENSHOTS=1</c> puts it into the repository.</summary>
public sealed class DemonstrationTests(PublicSite site)
{
    [Fact]
    public async Task Every_page_says_that_the_demonstration_is_invented()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var store = server.Store;
        await new DemoLoader(store.Network, store.Days, store.Keys, store.Maintenance, TimeProvider.System, TextWriter.Null).LoadAsync(TestContext.Current.CancellationToken);
        await site.VisitAsync(Look.Desk, async visit =>
        {
            foreach (var address in new[] { "/", "/stations", "/coverage", "/data", "/methods" })
            {
                await visit.OpenAsync(address);
                await Assertions.Expect(visit.Page.GetByText("Invented demonstration data")).ToBeVisibleAsync();
            }

            // The key that the start prints is good for the station that the page names.
            await visit.OpenAsync("/data");
            var line = (await visit.Page.Locator("#example-curl code").TextContentAsync())!;
            using var client = new HttpClient();
            using var request = new HttpRequestMessage(HttpMethod.Put, line.Split(' ', StringSplitOptions.RemoveEmptyEntries).Single(word => word.StartsWith("http", StringComparison.Ordinal)))
            {
                Headers = { Authorization = new("Bearer", DemoScenario.Key) },
                Content = new StringContent((await visit.Page.Locator("#example-sheet code").TextContentAsync())!, new MediaTypeHeaderValue("text/csv")),
            };
            using var answer = await client.SendAsync(request, TestContext.Current.CancellationToken);
            Assert.True(answer.IsSuccessStatusCode, answer.StatusCode.ToString());

            await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
            await Assertions.Expect(visit.Page.GetByText("Invented demonstration data")).ToBeVisibleAsync();
            await visit.ChartAsync();
            var picture = await visit.Page.ScreenshotAsync();
            Assert.Equal([0x89, (byte)'P', (byte)'N', (byte)'G'], picture[..4]);
            if (Environment.GetEnvironmentVariable("BANDTIDE_SCREENSHOTS") is "1")
            {
                var folder = Directory.CreateDirectory(Path.Combine(Repository.Root, "tests", "Bandtide.Browser.Tests", "Screenshots"));
                await File.WriteAllBytesAsync(Path.Combine(folder.FullName, "hours.png"), picture, TestContext.Current.CancellationToken);
            }
        }, server.Address);
    }
}
