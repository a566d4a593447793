using Bandtide.Browser.Tests.Site;
using Microsoft.Playwright;

namespace Bandtide.Browser.Tests.Screens;

/// <summary>The Hours page as a reader finds their way on it: by roles and labels.</summary>
public sealed class HoursScreen(Visit visit)
{
    private readonly IPage page = visit.Page;

    public ILocator Picture => page.GetByRole(AriaRole.Main).GetByRole(AriaRole.Img);

    public ILocator Place => page.GetByLabel("Region or station");

    public ILocator Month => page.GetByLabel("Month", new() { Exact = true });

    public ILocator Measure => page.GetByLabel("Measure");

    public ILocator Statistic => page.GetByLabel("Statistic");

    public ILocator Clock => page.GetByLabel("Clock");

    public ILocator Rows => page.GetByLabel("Rows");

    public ILocator Show => page.GetByRole(AriaRole.Button, new() { Name = "Show" });

    public ILocator Address => page.GetByLabel("Address of this view");

    public ILocator Table => page.GetByRole(AriaRole.Table);

    /// <summary>The cells of the live chart, to point at.</summary>
    public ILocator LiveCells => page.Locator(".live .nsewdrag");

    /// <summary>The label that appears where the reader points.</summary>
    public ILocator HoverLabel => page.Locator(".live .hoverlayer .hovertext");

    public ILocator Heading(string text) => page.GetByRole(AriaRole.Heading, new() { Name = text });

    public ILocator Link(string name) => page.GetByRole(AriaRole.Link, new() { Name = name, Exact = true });

    public static async Task<HoursScreen> OpenAsync(Visit visit, string query = "")
    {
        await visit.OpenAsync("/hours" + query);
        return new(visit);
    }

    /// <summary>Points at the middle of a cell.</summary>
    /// <param name="row">Row from the top, from 0.</param>
    /// <param name="rows">Number of rows.</param>
    /// <param name="hour">Column, 0 to 23.</param>
    public async Task PointAtAsync(int row, int rows, int hour)
    {
        await LiveCells.ScrollIntoViewIfNeededAsync();
        var box = await LiveCells.BoundingBoxAsync() ?? throw new InvalidOperationException("The chart has no size.");
        await page.Mouse.MoveAsync((float)(box.X + box.Width * (hour + 0.5) / 24), (float)(box.Y + box.Height * (row + 0.5) / rows));
    }
}
