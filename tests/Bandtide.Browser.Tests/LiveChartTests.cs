using System.Globalization;
using System.Text.Json.Nodes;
using Bandtide.Browser.Tests.Screens;
using Bandtide.Browser.Tests.Site;
using Bandtide.Server.Tests.Hosting;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests;

public sealed class LiveChartTests(PublicSite site)
{
    private const string BoxOf = "element => { const box = element.getBoundingClientRect(); return [box.x, box.y, box.width, box.height]; }";

    [Fact]
    public Task The_chart_takes_over_without_moving_anything() => site.VisitAsync(Look.Desk, async visit =>
    {
        await visit.Page.AddInitScriptAsync(
            "window.shift = 0; new PerformanceObserver(list => { for (const entry of list.getEntries()) window.shift += entry.value; }).observe({ type: 'layout-shift', buffered: true });");
        await HoursScreen.OpenAsync(visit, "?station=lighthouse&month=2026-06");
        await visit.ChartAsync();
        var chart = await visit.Page.Locator(".live .heatmaplayer image").EvaluateAsync<double[]>(BoxOf);
        var still = visit.Page.Locator(".fig-cells > svg");

        // Left, top, width, height of the picture as it stands without a chart.
        double[] drawn = [];
        await site.VisitAsync(Look.NoScript, async reader =>
        {
            await HoursScreen.OpenAsync(reader, "?station=lighthouse&month=2026-06");
            drawn = await reader.Page.Locator(".fig-cells > svg").EvaluateAsync<double[]>(BoxOf);
        });
        Assert.True(drawn[2] > 500 && drawn[3] > 500, "the picture has its size at once");
        Assert.All(drawn.Zip(chart), pair => Assert.Equal(pair.First, pair.Second, 1.5));
        await Assertions.Expect(still).ToBeHiddenAsync();

        // Web Vitals: under 0.1 is good. Late type may move a line by a pixel; the picture must not.
        Assert.True(await visit.Page.EvaluateAsync<double>("window.shift") < 0.02);
        Assert.Empty(visit.Complaints);
    });

    [Fact]
    public Task Pointing_at_a_cell_tells_value_interval_stations_and_days() => site.VisitAsync(Look.Desk, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?region=club&month=2026-06");
        await visit.ChartAsync();
        var answer = await AnswerAsync("heatmap?region=club&month=2026-06");
        var bands = answer["bands"]!.AsArray().Select(band => band!.GetValue<string>()).ToList();
        var band = bands.IndexOf("bc-31m");
        await hours.PointAtAsync(bands.Count - 1 - band, bands.Count, 5);

        await Assertions.Expect(hours.HoverLabel).ToBeVisibleAsync();
        var label = string.Join(' ', await hours.HoverLabel.Locator("tspan").AllTextContentsAsync());
        Assert.Contains("31 m broadcasting, 9400–9900 kHz", label, StringComparison.Ordinal);
        Assert.Contains("05–06 UTC", label, StringComparison.Ordinal);
        Assert.Contains($"{Percent(answer, "values", band, 5)} %", label, StringComparison.Ordinal);
        Assert.Contains($"95 % interval {Percent(answer, "lower", band, 5)} to {Percent(answer, "upper", band, 5)}", label, StringComparison.Ordinal);
        Assert.Contains($"{answer["stations"]![band]![5]} stations, {answer["days"]![band]![5]} station-days", label, StringComparison.Ordinal);
    });

    [Fact]
    public Task Pointing_at_a_gap_says_not_observed() => site.VisitAsync(Look.Desk, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?station=mast&month=2026-06");
        await visit.ChartAsync();
        await hours.PointAtAsync(0, 1, 15);
        await Assertions.Expect(hours.HoverLabel).ToContainTextAsync("not observed");
    });

    [Fact]
    public Task Choosing_another_month_changes_picture_and_address_in_place() => site.VisitAsync(Look.Desk, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await visit.ChartAsync();
        await visit.Page.EvaluateAsync("window.sameDocument = true");
        await hours.Month.FillAsync("2026-05");
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, mean: All stations, May 2026");
        await hours.Clock.SelectOptionAsync("Solar time");
        await hours.Statistic.SelectOptionAsync("Median");
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, median: All stations, May 2026");

        Assert.EndsWith("/hours?region=all&month=2026-05&stat=median&clock=solar", visit.Page.Url, StringComparison.Ordinal);
        Assert.True(await visit.Page.EvaluateAsync<bool>("window.sameDocument === true"), "the document was not loaded again");
        await Assertions.Expect(hours.Address).ToHaveValueAsync(visit.Page.Url);
        Assert.Empty(visit.Complaints);

        // A stranger who is given the address sees the same.
        var cells = await visit.Page.Locator(".fig-cells").InnerHTMLAsync();
        await site.VisitAsync(Look.NoScript, async stranger =>
        {
            await stranger.OpenAsync(visit.Page.Url);
            Assert.Equal(cells, await stranger.Page.Locator(".fig-cells").InnerHTMLAsync());
        });

        await visit.Page.GoBackAsync();
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, mean: All stations, May 2026");
    });

    [Fact]
    public Task Turning_dark_recolours_the_live_chart() => site.VisitAsync(Look.Desk, async visit =>
    {
        await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await visit.ChartAsync();
        var image = visit.Page.Locator(".live .heatmaplayer image");
        var light = await image.GetAttributeAsync("xlink:href");
        await visit.Page.EmulateMediaAsync(new() { ColorScheme = ColorScheme.Dark });
        await Assertions.Expect(image).Not.ToHaveAttributeAsync("xlink:href", light!, new() { Timeout = 10000 });
    });

    [Fact]
    public Task On_paper_the_drawn_picture_stands_and_controls_do_not() => site.VisitAsync(Look.Desk, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await visit.ChartAsync();
        await visit.Page.EmulateMediaAsync(new() { Media = Media.Print });
        await Assertions.Expect(visit.Page.Locator(".fig-cells > svg")).ToBeVisibleAsync();
        await Assertions.Expect(visit.Page.Locator(".live")).ToBeHiddenAsync();
        await Assertions.Expect(hours.Show).ToBeHiddenAsync();
        await Assertions.Expect(visit.Page.GetByRole(AriaRole.Navigation, new() { Name = "Pages" })).ToBeHiddenAsync();
    });

    private async Task<JsonNode> AnswerAsync(string path)
    {
        using var response = await site.Host.Visitor.GetAsync(path, "application/json");
        response.EnsureSuccessStatusCode();
        return await response.JsonAsync();
    }

    private static string Percent(JsonNode answer, string part, int band, int hour) =>
        (answer[part]![band]![hour]!.GetValue<double>() * 100).ToString("0.0", CultureInfo.InvariantCulture);
}
