using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using Microsoft.Playwright;

[assembly: AssemblyFixture(typeof(Bandtide.Browser.Tests.Site.PublicSite))]
[assembly: Xunit.v3.Parallelization(Mode = Xunit.Sdk.ParallelMode.None)]

namespace Bandtide.Browser.Tests.Site;

/// <summary>One real server with the sample network, and one real Chromium, for all tests.</summary>
public sealed class PublicSite : IAsyncLifetime
{
    private IPlaywright? playwright;
    private ServerHost? host;
    private IBrowser? browser;

    /// <summary>The moment it is on the server: a day after the newest day of the network.</summary>
    public static DateTimeOffset Now { get; } = new(2026, 6, 29, 12, 0, 0, TimeSpan.Zero);

    public ServerHost Host => host ?? throw new InvalidOperationException("Not started.");

    /// <summary>Keys by station.</summary>
    public IReadOnlyDictionary<string, string> Keys { get; private set; } = new Dictionary<string, string>(StringComparer.Ordinal);

    public async ValueTask InitializeAsync()
    {
        host = await ServerHost.StartAsync(StoreKind.Sqlite, new SettableClock(Now));
        Keys = await SampleNetwork.FillAsync(host);
        playwright = await Playwright.CreateAsync();
        browser = await playwright.Chromium.LaunchAsync(new()
        {
            ExecutablePath = "/usr/bin/chromium",
            Args = ["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync"],
        });
    }

    public async ValueTask DisposeAsync()
    {
        if (browser is not null)
        {
            await browser.DisposeAsync();
        }

        playwright?.Dispose();
        if (host is not null)
        {
            await host.DisposeAsync();
        }
    }

    /// <summary>A reader with a browser window of their own.</summary>
    /// <param name="look">Width, colours and whether script runs.</param>
    /// <param name="visit">What the reader does.</param>
    /// <param name="server">Another server than the common one.</param>
    public async Task VisitAsync(Look look, Func<Visit, Task> visit, Uri? server = null)
    {
        await using var context = await browser!.NewContextAsync(new()
        {
            BaseURL = (server ?? Host.Address).AbsoluteUri,
            ViewportSize = new() { Width = look.Width, Height = 900 },
            ColorScheme = look.IsDark ? ColorScheme.Dark : ColorScheme.Light,
            JavaScriptEnabled = look.HasScript,
            AcceptDownloads = true,
            Locale = "en-GB",
        });
        var page = await context.NewPageAsync();
        var reader = new Visit(page, server ?? Host.Address);
        try
        {
            await visit(reader);
        }
        catch
        {
            await page.ScreenshotAsync(new() { Path = FailurePath(), FullPage = true });
            throw;
        }
    }

    private static string FailurePath()
    {
        var name = string.Concat(TestContext.Current.Test?.TestDisplayName.Where(char.IsAsciiLetterOrDigit) ?? "test");
        return Path.Combine(Repository.Root, "artifacts", "browser-failures", $"{(name.Length > 120 ? name[^120..] : name)}.png");
    }
}
