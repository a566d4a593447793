using System.Globalization;
using System.Net;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>Measured day sheets go through the public API as they are, and what it shows agrees with the file.</summary>
public sealed class MeasuredDataTests
{
    // Positions as published with the data sets; Measured/README.md names the source of jp-tyo.
    private static readonly Dictionary<string, (double Latitude, double Longitude)> Places = new(StringComparer.Ordinal)
    {
        ["jp-tyo"] = (35.646, 139.625),
        ["us-al"] = (33.375, -87.583),
        ["us-mo"] = (38.917, -92.167),
        ["us-nj"] = (40.742, -74.179),
        ["us-oh"] = (40.167, -83.667),
        ["us-pa"] = (41.333, -75.667),
        ["us-pa-b"] = (41.354, -75.625),
        ["us-wa"] = (48.542, -123.167),
    };

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_measured_days_of_Tokyo_are_shown_as_they_were_sent(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await UploadAndCompareAsync(server, MeasuredData.Tokyo);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task All_measured_files_beside_the_repository_are_shown_as_they_were_sent(StoreKind kind)
    {
        Assert.SkipWhen(MeasuredData.Beside.Count == 0, "No folder shared/data/daysheets beside the repository; its licence does not allow a copy.");
        await using var server = await ServerHost.StartAsync(kind);
        foreach (var file in MeasuredData.Beside)
        {
            await UploadAndCompareAsync(server, file);
        }

        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    private static async Task UploadAndCompareAsync(ServerHost server, string file)
    {
        var code = Path.GetFileNameWithoutExtension(file);
        await server.AddStationAsync(code, Places[code].Latitude, Places[code].Longitude, "dBFS");
        var rows = Rows(file);
        var dates = rows.Select(row => row["date"]).Distinct(StringComparer.Ordinal).ToList();

        var lines = await server.Coordinator.PostDaysAsync(code, await File.ReadAllTextAsync(file, Ct));
        Assert.Equal(dates.Select(date => $"{date} created"), lines.Select(line => $"{line["date"]} {line["status"]}"));
        Assert.Equal(rows.Count, lines.Sum(line => line["cells"]!.GetValue<int>()));
        foreach (var month in dates.Select(date => date[..7]).Distinct(StringComparer.Ordinal))
        {
            var ofMonth = rows.Where(row => row["date"].StartsWith(month, StringComparison.Ordinal)).ToList();
            foreach (var measure in new[] { "occupancy", "signal", "excess", "level", "level-p90", "floor" })
            {
                await CompareHeatmapAsync(server, code, month, measure, ofMonth);
            }

            await CompareCoverageAsync(server, code, month, ofMonth);
        }

        await CompareDayAsync(server, code, dates[0], [.. rows.Where(row => string.Equals(row["date"], dates[0], StringComparison.Ordinal))]);
    }

    private static async Task CompareHeatmapAsync(ServerHost server, string code, string month, string measure, List<Dictionary<string, string>> rows)
    {
        var answer = await (await server.Visitor.GetAsync($"heatmap?station={code}&month={month}&measure={measure}", null)).JsonAsync();
        var expected = rows.Select(row => (Band: row["band"], Hour: int.Parse(row["hour"], CultureInfo.InvariantCulture), Value: Value(row, measure)))
            .Where(cell => cell.Value is not null)
            .ToLookup(cell => (cell.Band, cell.Hour), cell => cell.Value!.Value);
        var bands = answer["bands"]!.AsArray().Select(band => band!.GetValue<string>()).ToList();
        Assert.Equal(expected.Select(cell => cell.Key.Band).Distinct(StringComparer.Ordinal).OrderBy(Kilohertz), bands);
        for (var b = 0; b < bands.Count; b++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var values = expected[(bands[b], hour)].ToList();
                var shown = answer["values"]![b]![hour]?.GetValue<double>();
                Assert.Equal(values.Count, answer["days"]![b]![hour]!.GetValue<int>());
                Assert.True(
                    values.Count == 0 ? shown is null : Math.Abs(values.Average() - shown!.Value) <= (measure is "occupancy" ? 1e-4 : 0.01),
                    $"{code} {month} {measure} {bands[b]} {hour}: {shown}");
            }
        }
    }

    private static async Task CompareCoverageAsync(ServerHost server, string code, string month, List<Dictionary<string, string>> rows)
    {
        var coverage = await (await server.Visitor.GetAsync($"coverage?station={code}&month={month}", null)).JsonAsync();
        var dates = coverage["dates"]!.AsArray().Select(date => date!.GetValue<string>()).ToList();
        Assert.Equal(DateTime.DaysInMonth(int.Parse(month[..4], CultureInfo.InvariantCulture), int.Parse(month[5..], CultureInfo.InvariantCulture)), dates.Count);
        var byDate = rows.ToLookup(row => row["date"], StringComparer.Ordinal);
        for (var d = 0; d < dates.Count; d++)
        {
            var day = byDate[dates[d]].ToList();
            int? Told(string name) => coverage[name]![0]![d]?.GetValue<int>();
            Assert.Equal(day.Count == 0 ? null : day.Count, Told("cells"));
            Assert.Equal(day.Count == 0 ? null : day.Select(row => row["hour"]).Distinct(StringComparer.Ordinal).Count(), Told("hours"));
            Assert.Equal(day.Count == 0 ? null : day.Select(row => row["band"]).Distinct(StringComparer.Ordinal).Count(), Told("bands"));
        }
    }

    private static async Task CompareDayAsync(ServerHost server, string code, string date, List<Dictionary<string, string>> rows)
    {
        using var response = await server.Visitor.GetAsync($"stations/{code}/days/{date}", "text/csv");
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        var read = Rows((await response.Content.ReadAsStringAsync(Ct)).TrimEnd('\n').Split('\n')).ToDictionary(row => (row["hour"], row["band"]));
        Assert.Equal(rows.Count, read.Count);
        foreach (var row in rows)
        {
            var back = read[(row["hour"], row["band"])];
            foreach (var name in new[] { "sweeps", "occupancy", "signal", "level", "level_p90", "floor" })
            {
                Assert.Equal(Number(row[name]), Number(back[name]));
            }
        }
    }

    private static double? Value(Dictionary<string, string> row, string measure) => measure switch
    {
        "excess" => Number(row["signal"]) - Number(row["floor"]),
        "level-p90" => Number(row["level_p90"]),
        _ => Number(row[measure]),
    };

    private static double? Number(string text) => text.Length == 0 ? null : double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private static int Kilohertz(string band) => int.Parse(band.Split('-')[1], CultureInfo.InvariantCulture);

    private static List<Dictionary<string, string>> Rows(string file) => Rows(File.ReadAllLines(file));

    private static List<Dictionary<string, string>> Rows(string[] lines)
    {
        var names = lines[0].Split(',');
        return [.. lines.Skip(1).Select(line => names.Zip(line.Split(',')).ToDictionary(pair => pair.First, pair => pair.Second, StringComparer.Ordinal))];
    }
}
