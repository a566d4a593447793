using Bandtide.Browser.Tests.Screens;
using Bandtide.Browser.Tests.Site;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests;

public sealed class FirstPaintTests(PublicSite site)
{
    [Fact]
    public Task Without_script_the_page_holds_the_picture_and_its_words() => site.VisitAsync(Look.NoScript, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?station=lighthouse&month=2026-06");
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, mean: Lighthouse, June 2026");
        Assert.True(await visit.Page.Locator(".fig-cells path").CountAsync() > 10, "coloured cells are drawn");
        await Assertions.Expect(visit.Page.GetByText("31 m broadcasting")).ToBeVisibleAsync();
        await Assertions.Expect(visit.Page.GetByText("9400–9900 kHz")).ToBeVisibleAsync();
        await Assertions.Expect(visit.Page.GetByText("Mean over 28 days of one station.")).ToBeVisibleAsync();
        await Assertions.Expect(visit.Page.GetByText("Sunrise 02:").First).ToBeVisibleAsync();
        Assert.Empty(visit.Complaints);
    });

    [Fact]
    public Task Without_script_the_form_leads_to_a_short_address() => site.VisitAsync(Look.NoScript, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit);
        await hours.Place.SelectOptionAsync("Granary");
        await hours.Month.FillAsync("2026-05");
        await hours.Measure.SelectOptionAsync("Noise floor");
        await hours.Show.ClickAsync();
        await Assertions.Expect(visit.Page).ToHaveURLAsync(new Uri(site.Host.Address, "/hours?station=granary&month=2026-05&measure=floor").AbsoluteUri);
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Noise floor, mean: Granary, May 2026");
    });

    [Fact]
    public Task Without_script_months_table_and_year_are_links() => site.VisitAsync(Look.NoScript, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await hours.Link("‹ May 2026").ClickAsync();
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, mean: All stations, May 2026");
        await hours.Link("Table").ClickAsync();
        await Assertions.Expect(hours.Table).ToBeVisibleAsync();
        await hours.Link("Twelve months").ClickAsync();
        await visit.Page.GetByRole(AriaRole.Link, new() { Name = "June 2026" }).ClickAsync();
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, mean: All stations, June 2026");
    });

    [Fact]
    public Task What_cannot_be_answered_is_said_and_the_form_stays() => site.VisitAsync(Look.NoScript, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?region=all&month=2026-13");
        await Assertions.Expect(visit.Page.GetByRole(AriaRole.Alert)).ToContainTextAsync("'2026-13' is not a month");
        await Assertions.Expect(hours.Show).ToBeVisibleAsync();
    });

    [Fact]
    public Task One_band_on_one_day_is_one_row_with_hatching_zero_and_a_dot() => site.VisitAsync(Look.NoScript, async visit =>
    {
        await HoursScreen.OpenAsync(visit, "?station=mast&month=2026-06");
        var page = visit.Page;
        Assert.Equal(1, await page.Locator(".fig-name").CountAsync());

        // 22 hours nobody observed, in two runs; two values, one of them zero; both of one day, hence dots.
        Assert.Equal(2, await page.Locator(".fig-unobserved").CountAsync());
        Assert.Equal(2, await page.Locator(".fig-cells path").CountAsync());
        Assert.Equal(1, await page.Locator(".fig-cells path.s0").CountAsync());
        Assert.Equal(2, await page.Locator(".fig-cells circle").CountAsync());
        await Assertions.Expect(page.GetByText("Mean over 1 day of one station.")).ToBeVisibleAsync();
    });

    [Fact]
    public Task A_month_without_a_day_says_so() => site.VisitAsync(Look.NoScript, async visit =>
    {
        await HoursScreen.OpenAsync(visit, "?station=mast&month=2026-05");
        Assert.Equal(0, await visit.Page.Locator(".fig-cells").CountAsync());
        Assert.NotEmpty(await visit.Page.Locator(".figure .notes").AllInnerTextsAsync());
    });
}
