using System.Globalization;
using System.Xml.Linq;
using Bandtide.Browser.Tests.Screens;
using Bandtide.Browser.Tests.Site;
using Bandtide.Server.Tests.Hosting;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests;

public sealed class NumbersTests(PublicSite site)
{
    [Theory]
    [InlineData("region=all&month=2026-06", 100)]
    [InlineData("region=club&month=2026-06&measure=floor&stat=median", 1)]
    [InlineData("station=orchard&month=2026-06&stat=sd", 100)]
    public Task The_table_holds_the_numbers_of_the_programming_interface(string query, double factor) => site.VisitAsync(Look.NoScript, async visit =>
    {
        using var response = await site.Host.Visitor.GetAsync($"heatmap?{query}", "application/json");
        var answer = await response.JsonAsync();
        var hours = await HoursScreen.OpenAsync(visit, $"?{query}&view=table");
        var rows = await hours.Table.Locator("tbody tr").AllAsync();
        var bands = answer["bands"]!.AsArray();
        Assert.Equal(bands.Count, rows.Count);

        for (var band = 0; band < bands.Count; band++)
        {
            // The highest band stands on top.
            var cells = await rows[bands.Count - 1 - band].Locator("td").AllInnerTextsAsync();
            for (var hour = 0; hour < 24; hour++)
            {
                var lines = cells[hour].Split('\n', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries);
                if (answer["values"]![band]![hour] is not { } value)
                {
                    Assert.True(lines[0] is "–" or "–not observed" or "none •" || lines[0].Contains("not observed", StringComparison.Ordinal), cells[hour]);
                    continue;
                }

                Assert.Equal(Text(value.GetValue<double>() * factor), lines[0].Replace(" •", "", StringComparison.Ordinal));
                if (answer["lower"]![band]![hour] is { } lower)
                {
                    Assert.Equal($"{Text(lower.GetValue<double>() * factor)} to {Text(answer["upper"]![band]![hour]!.GetValue<double>() * factor)}", lines[1]);
                }

                Assert.Equal($"{answer["stations"]![band]![hour]}, {answer["days"]![band]![hour]}", lines[^1]);
            }
        }
    });

    [Fact]
    public Task Numbers_and_picture_can_be_taken_away() => site.VisitAsync(Look.Desk, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?station=lighthouse&month=2026-06");
        await visit.ChartAsync();
        var csv = await DownloadAsync(visit, hours.Link("CSV"));
        Assert.Equal("bandtide-lighthouse-june-2026-occupancy.csv", csv.Name);
        Assert.StartsWith("band,hour,value,lower,upper,stations,days\n", csv.Text, StringComparison.Ordinal);
        var svg = await DownloadAsync(visit, hours.Link("picture as SVG"));
        Assert.EndsWith(".svg", svg.Name, StringComparison.Ordinal);
        Assert.Equal("Occupancy, mean: Lighthouse, June 2026", XDocument.Parse(svg.Text).Root!.Element(XName.Get("title", "http://www.w3.org/2000/svg"))!.Value);
    });

    [Fact]
    public Task Coverage_tells_complete_partial_withdrawn_and_missing_days_apart_in_words() => site.VisitAsync(Look.NoScript, async visit =>
    {
        await visit.OpenAsync("/coverage?station=orchard&month=2026-06");
        var row = visit.Page.GetByRole(AriaRole.Row, new() { Name = "Orchard" });
        var days = await row.Locator("td").AllInnerTextsAsync();
        using var response = await site.Host.Visitor.GetAsync("coverage?station=orchard&month=2026-06&format=csv", "text/csv");
        var sent = (await response.Content.ReadAsStringAsync(TestContext.Current.CancellationToken)).Split('\n').Skip(1).Where(line => line.Length > 0)
            .Select(line => line.Split(',')).ToDictionary(part => part[1], StringComparer.Ordinal);
        for (var day = 1; day <= 30; day++)
        {
            var expected = !sent.TryGetValue($"2026-06-{day:00}", out var part) ? "not reported" : part[5] is "true" ? "withdrawn" : part[2];
            Assert.Contains(expected, days[day - 1], StringComparison.Ordinal);
        }

        Assert.Contains("withdrawn", days[11], StringComparison.Ordinal);
        Assert.Contains(days, text => text.Contains("not reported", StringComparison.Ordinal));
    });

    [Fact]
    public Task No_page_tells_where_a_station_stands_more_precisely_than_its_square() => site.VisitAsync(Look.NoScript, async visit =>
    {
        var (latitude, longitude) = SampleNetwork.LighthousePosition;
        foreach (var address in new[] { "/", "/stations", "/stations/lighthouse", "/hours?station=lighthouse&month=2026-06" })
        {
            await visit.OpenAsync(address);
            var markup = await visit.Page.ContentAsync();
            Assert.DoesNotContain(latitude.ToString(CultureInfo.InvariantCulture), markup, StringComparison.Ordinal);
            Assert.DoesNotContain(longitude.ToString(CultureInfo.InvariantCulture), markup, StringComparison.Ordinal);
        }

        await Assertions.Expect(visit.Page.GetByText("square JO34").First).ToBeVisibleAsync();
    });

    [Fact]
    public Task The_front_page_says_who_reported_for_the_last_complete_day() => site.VisitAsync(Look.NoScript, async visit =>
    {
        await visit.OpenAsync("/");
        await Assertions.Expect(visit.Page.GetByText("Last complete day: 28 June 2026")).ToBeVisibleAsync();
        var reporters = visit.Page.GetByRole(AriaRole.Region, new() { Name = "Who reported" });
        await Assertions.Expect(reporters).ToContainTextAsync("of 5 reported for 28 June 2026");
        await Assertions.Expect(reporters).ToContainTextAsync("Not heard from for that day:");
        await Assertions.Expect(reporters.GetByRole(AriaRole.Link, new() { Name = "Mast" })).ToBeVisibleAsync();
    });

    private static string Text(double value)
    {
        var text = Math.Abs(value).ToString("0.0", CultureInfo.InvariantCulture);
        return value < 0 && text is not "0.0" ? "−" + text : text;
    }

    private static async Task<(string Name, string Text)> DownloadAsync(Visit visit, ILocator link)
    {
        var download = await visit.Page.RunAndWaitForDownloadAsync(() => link.ClickAsync());
        return (download.SuggestedFilename, await File.ReadAllTextAsync(await download.PathAsync(), TestContext.Current.CancellationToken));
    }
}
