using System.Diagnostics;
using System.Management.Automation;
using System.Text.Json.Nodes;
using Bandtide.Browser.Tests.Site;
using Bandtide.Server.Tests.Hosting;

namespace Bandtide.Browser.Tests;

/// <summary>The commands and scripts of the Data page, run exactly as printed, against the server that printed them.</summary>
public sealed class UploadExampleTests(PublicSite site)
{
    // The page takes the first station by code, and yesterday.
    private const string Station = "granary";
    private const string Date = "2026-06-28";

    [Fact]
    public Task The_curl_line_works_as_printed() => RunAsync(async (printed, folder) =>
    {
        await File.WriteAllTextAsync(Path.Combine(folder, Date + ".csv"), printed("example-sheet"), TestContext.Current.CancellationToken);
        AssertReceipt(await ShellAsync(folder, "bash", "-c", printed("example-curl")));
    });

    [Fact]
    public Task The_Python_script_works_as_printed() => RunAsync(async (printed, folder) =>
    {
        await File.WriteAllTextAsync(Path.Combine(folder, Date + ".csv"), printed("example-sheet"), TestContext.Current.CancellationToken);
        await File.WriteAllTextAsync(Path.Combine(folder, "send_day.py"), printed("example-python"), TestContext.Current.CancellationToken);
        AssertReceipt(await ShellAsync(folder, "python3", "send_day.py", Date + ".csv"));
    });

    [Fact]
    public Task The_PowerShell_script_works_as_printed() => RunAsync(async (printed, folder) =>
    {
        var sheet = Path.Combine(folder, Date + ".csv");
        await File.WriteAllTextAsync(sheet, printed("example-sheet"), TestContext.Current.CancellationToken);
        Environment.SetEnvironmentVariable("BANDTIDE_KEY", site.Keys[Station]);
        using var shell = PowerShell.Create();
        var answer = await Task.Run(() => shell.AddScript(printed("example-powershell")).AddArgument(sheet).Invoke(), TestContext.Current.CancellationToken);
        Assert.Empty(shell.Streams.Error);
        var receipt = Assert.Single(answer);
        Assert.Equal(Date, receipt.Properties["date"].Value?.ToString());
        Assert.Contains(receipt.Properties["status"].Value?.ToString(), new[] { "created", "replaced", "unchanged" });
        Assert.Equal(3L, Convert.ToInt64(receipt.Properties["cells"].Value, System.Globalization.CultureInfo.InvariantCulture));
    });

    [Fact]
    public Task The_bulk_line_works_as_printed() => RunAsync(async (printed, folder) =>
    {
        var rows = printed("example-sheet").Split('\n', StringSplitOptions.RemoveEmptyEntries);
        var days = string.Join('\n', rows.Select((row, index) => (index == 0 ? "date," : Date + ",") + row)) + "\n";
        await File.WriteAllTextAsync(Path.Combine(folder, "days.csv"), days, TestContext.Current.CancellationToken);
        AssertReceipt(await ShellAsync(folder, "bash", "-c", printed("example-bulk")));
    });

    [Fact]
    public Task A_refused_sheet_ends_the_Python_script_with_the_reason() => RunAsync(async (printed, folder) =>
    {
        await File.WriteAllTextAsync(Path.Combine(folder, Date + ".csv"), "hour,band,sweeps,occupancy\n25,bc-49m,720,0.4\n", TestContext.Current.CancellationToken);
        await File.WriteAllTextAsync(Path.Combine(folder, "send_day.py"), printed("example-python"), TestContext.Current.CancellationToken);
        var (code, _, error) = await ProcessAsync(folder, "python3", "send_day.py", Date + ".csv");
        Assert.Equal(1, code);
        Assert.StartsWith("400: ", error, StringComparison.Ordinal);
        Assert.Contains("hour-range", error, StringComparison.Ordinal);
    });

    private static void AssertReceipt(string text)
    {
        var receipt = JsonNode.Parse(text)!;
        Assert.Equal(Date, receipt["date"]!.GetValue<string>());
        Assert.Contains(receipt["status"]!.GetValue<string>(), new[] { "created", "replaced", "unchanged" });
        Assert.Equal(3, receipt["cells"]!.GetValue<int>());
        Assert.Equal(64 / 2, receipt["checksum"]!.GetValue<string>().Length);
    }

    private Task RunAsync(Func<Func<string, string>, string, Task> use) => site.VisitAsync(Look.NoScript, async visit =>
    {
        await visit.OpenAsync("/data");
        var texts = new Dictionary<string, string>(StringComparer.Ordinal);
        foreach (var id in new[] { "example-sheet", "example-curl", "example-python", "example-powershell", "example-bulk" })
        {
            texts[id] = (await visit.Page.Locator($"#{id} code").TextContentAsync())!;
        }

        Assert.Contains($"/stations/{Station}/days/{Date}", texts["example-curl"], StringComparison.Ordinal);
        var folder = Directory.CreateTempSubdirectory("bandtide-upload-");
        try
        {
            await use(id => texts[id], folder.FullName);
        }
        finally
        {
            folder.Delete(recursive: true);

            // Others read the day as the sample network has it: its revisions stay, the first is sent again.
            await RestoreAsync();
        }
    });

    private async Task RestoreAsync()
    {
        using var first = await site.Host.Visitor.GetAsync($"stations/{Station}/days/{Date}?revision=1", "text/csv");
        first.EnsureSuccessStatusCode();
        using var again = await site.Host.Coordinator.PutDayAsync(Station, Date, await first.Content.ReadAsStringAsync(TestContext.Current.CancellationToken));
        again.EnsureSuccessStatusCode();
    }

    private async Task<string> ShellAsync(string folder, string program, params string[] arguments)
    {
        var (code, output, error) = await ProcessAsync(folder, program, arguments);
        Assert.True(code == 0, $"{program} ended with {code}: {error}{output}");
        return output;
    }

    private async Task<(int Code, string Output, string Error)> ProcessAsync(string folder, string program, params string[] arguments)
    {
        var start = new ProcessStartInfo(program) { WorkingDirectory = folder, RedirectStandardOutput = true, RedirectStandardError = true, UseShellExecute = false };
        Array.ForEach(arguments, start.ArgumentList.Add);
        start.Environment["BANDTIDE_KEY"] = site.Keys[Station];
        using var process = Process.Start(start)!;
        var output = process.StandardOutput.ReadToEndAsync(TestContext.Current.CancellationToken);
        var error = process.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
        await process.WaitForExitAsync(TestContext.Current.CancellationToken);
        return (process.ExitCode, await output, await error);
    }
}
