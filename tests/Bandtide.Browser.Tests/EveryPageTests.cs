using Bandtide.Browser.Tests.Site;
using Deque.AxeCore.Playwright;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests;

/// <summary>What holds for every page, in light and dark, at a desk and on a phone.</summary>
public sealed class EveryPageTests(PublicSite site)
{
    private static readonly string[] Addresses =
    [
        "/",
        "/hours?region=all&month=2026-06",
        "/hours?station=mast&month=2026-06&mindays=1&vote=square",
        "/hours?region=club&from=2026-05&to=2026-06&measure=excess&clock=solar",
        "/hours?region=all&season=summer&years=2026",
        "/hours?region=club&month=2026-06&view=table",
        "/hours?region=all&month=2026-06&view=year",
        "/hours?region=all&month=nonsense",
        "/stations",
        "/stations/orchard?day=2026-06-12",
        "/coverage?region=all&month=2026-06",
        "/coverage?region=all&year=2026",
        "/data",
        "/methods",
    ];

    public static TheoryData<string, string> Pages
    {
        get
        {
            var data = new TheoryData<string, string>();
            foreach (var address in Addresses)
            {
                data.Add(address, "desk");
                data.Add(address, "dark");
                data.Add(address, "phone");
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Pages))]
    public Task A_page_is_accessible_fits_its_window_and_keeps_to_itself(string address, string look) => site.VisitAsync(LookOf(look), async visit =>
    {
        await visit.OpenAsync(address);
        if (await visit.Page.Locator(".plate").CountAsync() > 0)
        {
            await visit.ChartAsync();
        }

        // The scanner itself adds styles that the page's policy refuses: what it causes is not the page's.
        Assert.Empty(visit.Complaints);
        var found = await visit.Page.RunAxe();
        Assert.True(found.Violations.Length == 0, string.Join('\n', found.Violations.Select(one =>
            $"{one.Id}: {one.Help} at {string.Join(", ", one.Nodes.Select(node => node.Html).Take(3))}")));
        Assert.True(found.Passes.Length > 10, "the scan looked at the page");

        var sizes = await visit.Page.EvaluateAsync<int[]>("[document.documentElement.scrollWidth, document.documentElement.clientWidth]");
        Assert.Equal(sizes[1], sizes[0]);
    });

    [Theory]
    [InlineData("/nothing-here")]
    [InlineData("/stations/nobody")]
    [InlineData("/hours?station=nobody&month=2026-06")]
    public Task An_unknown_address_is_a_page_that_helps(string address) => site.VisitAsync(Look.Desk, async visit =>
    {
        var response = await visit.Page.GotoAsync(address);
        Assert.Equal(404, response!.Status);
        await Assertions.Expect(visit.Page.GetByRole(AriaRole.Heading, new() { Name = "No such page" })).ToBeVisibleAsync();

        // The browser itself complains of the status, and of nothing else.
        Assert.All(visit.Complaints, complaint => Assert.Contains("404", complaint, StringComparison.Ordinal));
        Assert.Empty((await visit.Page.RunAxe()).Violations);
    });

    [Fact]
    public Task Links_between_pages_work_with_a_circuit() => site.VisitAsync(Look.Desk, async visit =>
    {
        await visit.OpenAsync("/");
        await visit.CircuitAsync();
        foreach (var name in new[] { "Hours", "Coverage", "Stations", "Data", "Methods", "Today" })
        {
            await visit.Page.GetByRole(AriaRole.Navigation, new() { Name = "Pages" }).GetByRole(AriaRole.Link, new() { Name = name }).ClickAsync();
            await Assertions.Expect(visit.Page.GetByRole(AriaRole.Heading, new() { Name = name, Level = 1 })).ToBeVisibleAsync();
        }

        Assert.Empty(visit.Complaints);
    });

    private static Look LookOf(string name) => name switch { "dark" => Look.Dark, "phone" => Look.Phone, _ => Look.Desk };
}
