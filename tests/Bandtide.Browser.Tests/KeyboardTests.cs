using Bandtide.Browser.Tests.Screens;
using Bandtide.Browser.Tests.Site;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests;

public sealed class KeyboardTests(PublicSite site)
{
    private const string FocusedName = "(document.activeElement.getAttribute('aria-label') || document.activeElement.labels?.[0]?.textContent || document.activeElement.textContent || '').trim()";
    private const string FocusedOutline = "(() => { const style = getComputedStyle(document.activeElement); return style.outlineStyle !== 'none' && parseFloat(style.outlineWidth) >= 2; })()";

    [Fact]
    public Task The_first_stop_skips_to_the_content() => site.VisitAsync(Look.Desk, async visit =>
    {
        await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await visit.ChartAsync();
        await visit.Page.EvaluateAsync("document.activeElement.blur()");
        await visit.Page.Keyboard.PressAsync("Tab");
        Assert.Equal("Skip to the content", await visit.Page.EvaluateAsync<string>(FocusedName));
        await visit.Page.Keyboard.PressAsync("Enter");
        Assert.Equal("content", await visit.Page.EvaluateAsync<string>("document.activeElement.id"));
        await visit.Page.Keyboard.PressAsync("Tab");
        Assert.Equal("One month", await visit.Page.EvaluateAsync<string>(FocusedName));
        Assert.EndsWith("#content", visit.Page.Url, StringComparison.Ordinal);
        await Assertions.Expect(new HoursScreen(visit).Picture).ToBeAttachedAsync();
    });

    [Fact]
    public Task Every_stop_is_visible_and_in_reading_order() => site.VisitAsync(Look.NoScript with { HasScript = true }, async visit =>
    {
        await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await visit.ChartAsync();
        await visit.Page.EvaluateAsync("document.activeElement.blur()");
        var names = new List<string>();
        for (var stop = 0; stop < 40; stop++)
        {
            await visit.Page.Keyboard.PressAsync("Tab");
            if (await visit.Page.EvaluateAsync<bool>("document.activeElement === document.body"))
            {
                break;
            }

            Assert.True(await visit.Page.EvaluateAsync<bool>(FocusedOutline), $"focus shows on '{await visit.Page.EvaluateAsync<string>(FocusedName)}'");
            names.Add(await visit.Page.EvaluateAsync<string>(FocusedName));
        }

        string[] expected =
        [
            "Skip to the content", "Bandtide", "Today", "Hours", "Stations", "Coverage", "Data", "Methods", "One month", "Several months", "A season",
            "Region or station", "Month", "Measure", "Statistic", "Clock", "Rows", "Show", "More choices", "Picture", "Table", "Twelve months",
            "‹ May 2026", "July 2026 ›", "CSV", "JSON", "picture as SVG", "Address of this view", "Copy",
        ];

        // The month's field has several stops of its own in Chromium.
        Assert.Equal(expected, names.Where((name, index) => index == 0 || !string.Equals(name, names[index - 1], StringComparison.Ordinal)).Take(expected.Length));
    });

    [Fact]
    public Task A_month_is_chosen_and_the_table_read_by_keyboard_alone() => site.VisitAsync(Look.Desk, async visit =>
    {
        var hours = await HoursScreen.OpenAsync(visit, "?region=all&month=2026-06");
        await visit.ChartAsync();
        await hours.Link("‹ May 2026").FocusAsync();
        await visit.Page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(hours.Picture).ToHaveAccessibleNameAsync("Occupancy, mean: All stations, May 2026");
        await hours.Link("Table").FocusAsync();
        await visit.Page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(hours.Table).ToBeVisibleAsync();

        // The table's own box can be focused and scrolled.
        var box = visit.Page.GetByRole(AriaRole.Region, new() { Name = "Occupancy, mean" });
        await box.FocusAsync();
        for (var press = 0; press < 5; press++)
        {
            await visit.Page.Keyboard.PressAsync("ArrowRight");
        }

        await visit.Page.WaitForFunctionAsync("document.activeElement.scrollLeft > 0");
    });

    [Fact]
    public Task A_station_is_reached_from_the_map_by_keyboard() => site.VisitAsync(Look.Desk, async visit =>
    {
        await visit.OpenAsync("/stations");
        await visit.Page.GetByRole(AriaRole.Figure, new() { Name = "Map of the stations" }).GetByRole(AriaRole.Link, new() { Name = "Quarry" }).FocusAsync();
        await visit.Page.Keyboard.PressAsync("Enter");
        await Assertions.Expect(visit.Page.GetByRole(AriaRole.Heading, new() { Name = "Quarry", Level = 1 })).ToBeVisibleAsync();
    });
}
