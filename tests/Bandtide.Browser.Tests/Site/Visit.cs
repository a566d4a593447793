using Microsoft.Playwright;

namespace Bandtide.Browser.Tests.Site;

/// <summary>One reader's page with everything that went wrong on it.</summary>
public sealed class Visit
{
    private readonly List<string> complaints = [];

    public Visit(IPage page, Uri server)
    {
        Page = page;
        page.Console += (_, message) =>
        {
            if (message.Type is "error" or "warning")
            {
                complaints.Add($"console {message.Type}: {message.Text}");
            }
        };
        page.PageError += (_, error) => complaints.Add($"script error: {error}");
        page.Request += (_, request) =>
        {
            var address = new Uri(request.Url);
            if (address.Scheme is not ("data" or "blob") && !string.Equals(address.Authority, server.Authority, StringComparison.Ordinal))
            {
                complaints.Add($"request to another host: {request.Url}");
            }
        };
        page.Response += (_, response) =>
        {
            if (response.Status >= 400)
            {
                complaints.Add($"{response.Status}: {response.Url}");
            }
        };
    }

    public IPage Page { get; }

    /// <summary>Console errors and warnings (a refused script or style is one), script errors, failed answers and requests to another host.</summary>
    public IReadOnlyList<string> Complaints => complaints;

    /// <summary>Opens an address and waits until the page is as it will be: live where it has a circuit and a chart.</summary>
    public async Task OpenAsync(string address)
    {
        await Page.GotoAsync(address);
        await Page.EvaluateAsync("document.fonts.ready.then(() => true)");
    }

    /// <summary>Waits for the circuit.</summary>
    public Task CircuitAsync() => Assertions.Expect(Page.Locator("[data-interactive=true]")).ToHaveCountAsync(1, new() { Timeout = 30000 });

    /// <summary>Waits for the live chart.</summary>
    public Task ChartAsync() => Assertions.Expect(Page.Locator(".plate.is-live")).ToHaveCountAsync(1, new() { Timeout = 30000 });
}
