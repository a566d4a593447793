using System.Globalization;
using System.Net;
using System.Text.Json.Nodes;
using System.Xml.Linq;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>Heatmaps over HTTP: values, representations, tags, refusals.</summary>
public sealed class HeatmapTests
{
    private static readonly (string Code, double Latitude, double Longitude, int[] Days)[] Network =
        [("north", 52.5, 13.4, [1, 2, 3, 4, 5, 6]), ("next-door", 52.6, 13.3, [3, 4, 5]), ("south", -35, 20, [2, 9, 28])];

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Values_equal_the_plain_computation_from_the_sheets_as_read_back(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        var sheets = await FillAsync(server);
        string[] measures = ["occupancy", "signal", "excess", "level", "level-p90", "floor"];
        string[] stats = ["mean", "median", "p10", "p90", "sd"];
        foreach (var measure in measures)
        {
            foreach (var stat in stats)
            {
                await CompareAsync(server, new([.. sheets.Select(sheet => (sheet.Station, sheet.Station, sheet.Sheet))]), $"region=all&month=2026-06&measure={measure}&stat={stat}", measure, stat);
            }
        }

        var north = new PlainPool([.. sheets.Where(sheet => sheet.Station is "north").Select(sheet => (sheet.Station, sheet.Station, sheet.Sheet))]);
        await CompareAsync(server, north, "station=north&from=2026-05&to=2026-06&stat=sd", "occupancy", "sd");
        await CompareAsync(server, north, "station=north&month=2026-06&stat=p10&measure=level", "level", "p10");
        var all = new PlainPool([.. sheets.Select(sheet => (sheet.Station, sheet.Station, sheet.Sheet))]);
        await CompareAsync(server, all, "region=all&month=2026-06&mindays=4", "occupancy", "mean", minDays: 4);
        await CompareAsync(server, all, "region=all&month=2026-06&minsweeps=700&stat=median", "occupancy", "median", minSweeps: 700);
        var squares = new PlainPool([.. sheets.Select(sheet => (sheet.Station, sheet.Station is "south" ? "south" : "JO62", sheet.Sheet))]);
        await CompareAsync(server, squares, "region=all&month=2026-06&vote=square", "occupancy", "mean");
    }

    [Fact]
    public async Task The_answer_has_the_contracts_shape()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await FillAsync(server);
        using var response = await server.Visitor.GetAsync("heatmap?region=all&month=2026-06", null);
        var answer = (await response.JsonAsync()).AsObject();
        string[] names = ["measure", "unit", "stat", "clock", "hours", "bands", "values", "stations", "days", "lower", "upper", "revision"];
        Assert.Equal(names, answer.Select(entry => entry.Key).Take(names.Length));
        Assert.Equal(["occupancy", "1", "mean", "utc"], new[] { "measure", "unit", "stat", "clock" }.Select(name => answer[name]!.GetValue<string>()));
        Assert.Equal(Enumerable.Range(0, 24), answer["hours"]!.AsArray().Select(hour => hour!.GetValue<int>()));
        var bands = answer["bands"]!.AsArray().Count;
        Assert.All(new[] { "values", "stations", "days", "lower", "upper" }, name =>
        {
            Assert.Equal(bands, answer[name]!.AsArray().Count);
            Assert.All(answer[name]!.AsArray(), row => Assert.Equal(24, row!.AsArray().Count));
        });
        Assert.All(answer["lower"]!.AsArray().Zip(answer["upper"]!.AsArray()), rows => Assert.All(rows.First!.AsArray().Zip(rows.Second!.AsArray()), pair =>
        {
            Assert.InRange(pair.First!.GetValue<double>(), 0, 1);
            Assert.InRange(pair.Second!.GetValue<double>(), pair.First!.GetValue<double>(), 1);
        }));

        var level = await (await server.Visitor.GetAsync("heatmap?region=all&month=2026-06&measure=level&interval=none", null)).JsonAsync();
        Assert.Equal("dBm", level["unit"]!.GetValue<string>());
        Assert.All(level["lower"]!.AsArray(), row => Assert.All(row!.AsArray(), Assert.Null));
        var empty = await (await server.Visitor.GetAsync("heatmap?region=all&month=2020-01", null)).JsonAsync();
        Assert.Empty(empty["bands"]!.AsArray());
        Assert.NotEmpty(empty["note"]!.GetValue<string>());
    }

    [Fact]
    public async Task Csv_says_the_same_as_json_and_the_picture_is_svg()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await FillAsync(server);
        const string path = "heatmap?region=all&month=2026-06&measure=signal";
        var json = await (await server.Visitor.GetAsync(path, "application/json")).JsonAsync();
        using var response = await server.Visitor.GetAsync(path, "text/csv");
        Assert.Equal("text/csv", response.Content.Headers.ContentType?.MediaType);
        var lines = (await response.Content.ReadAsStringAsync(Ct)).TrimEnd('\n').Split('\n');
        Assert.Equal("band,hour,value,lower,upper,stations,days", lines[0]);
        Assert.Equal(24 * json["bands"]!.AsArray().Count, lines.Length - 1);
        foreach (var fields in lines.Skip(1).Select(line => line.Split(',')))
        {
            var (b, h) = (json["bands"]!.AsArray().Select(band => band!.GetValue<string>()).ToList().IndexOf(fields[0]), int.Parse(fields[1], CultureInfo.InvariantCulture));
            foreach (var (name, text) in new[] { "values", "lower", "upper", "stations", "days" }.Zip(fields.Skip(2)))
            {
                Assert.Equal(json[name]![b]![h]?.GetValue<double>(), text.Length == 0 ? null : double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture));
                Assert.DoesNotContain('E', text);
            }
        }

        using var picture = await server.Visitor.GetAsync(path, "image/svg+xml");
        Assert.Equal("image/svg+xml", picture.Content.Headers.ContentType?.MediaType);
        Assert.Equal("cross-origin", Assert.Single(picture.Headers.GetValues("Cross-Origin-Resource-Policy")));
        Assert.Equal("{http://www.w3.org/2000/svg}svg", XDocument.Parse(await picture.Content.ReadAsStringAsync(Ct)).Root!.Name.ToString());
    }

    // RFC 9110, 12.5.1: the most specific range decides, quality orders, the first offered wins between equals.
    [Theory]
    [InlineData(null, "", "application/json")]
    [InlineData("*/*", "", "application/json")]
    [InlineData("text/*", "", "text/csv")]
    [InlineData("text/html, image/*;q=0.8, */*;q=0.1", "", "image/svg+xml")]
    [InlineData("application/json;q=0.2, text/csv;q=0.9", "", "text/csv")]
    [InlineData("image/avif,image/webp,image/apng,image/svg+xml,image/*,*/*;q=0.8", "", "image/svg+xml")]
    [InlineData("application/json;q=0, */*", "", "text/csv")]
    [InlineData("text/csv", "&format=svg", "image/svg+xml")]
    [InlineData("text/html", "&format=json", "application/json")]
    [InlineData("image/png", "&format=csv", "text/csv")]
    public async Task The_representation_follows_accept_and_format(string? accept, string format, string expected)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        using var response = await server.Visitor.GetAsync($"heatmap?station=north&month=2026-06{format}", accept);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal(expected, response.Content.Headers.ContentType?.MediaType);
        Assert.Contains("Accept", response.Headers.Vary);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Each_representation_has_its_own_strong_tag_that_moves_with_the_data(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await FillAsync(server);
        const string path = "heatmap?region=all&month=2026-06";
        var tags = new Dictionary<string, string>(StringComparer.Ordinal);
        foreach (var type in new[] { "application/json", "text/csv", "image/svg+xml" })
        {
            using var first = await server.Visitor.GetAsync(path, type);
            tags[type] = first.Headers.ETag!.ToString();
            Assert.False(first.Headers.ETag!.IsWeak);
            using var again = await server.Visitor.GetAsync(path, type, tags[type]);
            Assert.Equal(HttpStatusCode.NotModified, again.StatusCode);
            Assert.Equal(tags[type], again.Headers.ETag!.ToString());
            Assert.Empty(await again.Content.ReadAsByteArrayAsync(Ct));
        }

        Assert.Equal(3, tags.Values.Distinct(StringComparer.Ordinal).Count());

        // Another month leaves it; the month itself, and a new member of the region, move it. Sending the same again does not.
        await server.Coordinator.PutDayAsync("north", "2026-05-01", SampleBodies.Csv(SampleSheets.Make(77)));
        Assert.Equal(HttpStatusCode.NotModified, await StatusAsync(server, path, tags["application/json"]));
        await server.Coordinator.PutDayAsync("north", "2026-06-01", SampleBodies.Csv(SampleSheets.Make(1)));
        Assert.Equal(HttpStatusCode.NotModified, await StatusAsync(server, path, tags["application/json"]));
        await server.Coordinator.PutDayAsync("north", "2026-06-01", SampleBodies.Csv(SampleSheets.Make(78)));
        Assert.Equal(HttpStatusCode.OK, await StatusAsync(server, path, tags["application/json"]));
        using var known = await server.Visitor.GetAsync(path, null);
        Assert.Equal(HttpStatusCode.OK, await StatusAsync(server, path + "&stat=median", known.Headers.ETag!.ToString()));
        Assert.Equal(HttpStatusCode.NotModified, await StatusAsync(server, path, $"\"other\", {known.Headers.ETag}"));
        Assert.Equal(HttpStatusCode.NotModified, await StatusAsync(server, path, "*"));
    }

    [Theory]
    [InlineData("month=2026-06", "region", "selection-missing")]
    [InlineData("station=north&region=all&month=2026-06", "station", "selection-contradictory")]
    [InlineData("station=north", "month", "period-missing")]
    [InlineData("station=north&month=2026-06&from=2026-01&to=2026-02", "month", "period-contradictory")]
    [InlineData("station=north&month=2026-06&season=winter", "month", "period-contradictory")]
    [InlineData("station=north&from=2026-01", "to", "month-missing")]
    [InlineData("station=north&to=2026-01", "from", "month-missing")]
    [InlineData("station=north&from=2026-02&to=2026-01", "to", "range-order")]
    [InlineData("station=north&month=2026-13", "month", "month-syntax")]
    [InlineData("station=north&month=June", "month", "month-syntax")]
    [InlineData("station=north&season=monsoon", "season", "choice")]
    [InlineData("station=north&years=2024", "season", "season-missing")]
    [InlineData("station=north&season=winter&years=2026..2024", "years", "years-syntax")]
    [InlineData("station=north&season=winter&years=soon", "years", "years-syntax")]
    [InlineData("station=north&month=2026-06&measure=loudness", "measure", "choice")]
    [InlineData("station=north&month=2026-06&stat=mode", "stat", "choice")]
    [InlineData("station=north&month=2026-06&clock=moon", "clock", "choice")]
    [InlineData("station=north&month=2026-06&layer=cake", "layer", "choice")]
    [InlineData("station=north&month=2026-06&adjust=station", "adjust", "adjust-unavailable")]
    [InlineData("station=north&month=2026-06&interval=wide", "interval", "choice")]
    [InlineData("station=north&month=2026-06&align=left", "align", "choice")]
    [InlineData("station=north&month=2026-06&vote=twice", "vote", "choice")]
    [InlineData("station=north&month=2026-06&mindays=0", "mindays", "minimum-range")]
    [InlineData("station=north&month=2026-06&minsweeps=many", "minsweeps", "minimum-range")]
    [InlineData("station=north&month=2026-06&format=pdf", "format", "choice")]
    [InlineData("station=north&month=2026-06&month=2026-07", "month", "value-twice")]
    [InlineData("station=north&month=2026-06&mesure=signal", "mesure", "name-unknown")]
    [InlineData("station=NORTH&month=2026-06", "station", "code-syntax")]
    public async Task A_query_that_cannot_be_meant_is_refused_and_names_field_and_rule(string query, string field, string rule)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var problems = await (await server.Visitor.GetAsync($"heatmap?{query}", null)).ProblemAsync(HttpStatusCode.BadRequest);
        Assert.Contains((0, field, rule), problems);
    }

    [Fact]
    public async Task Unknown_selections_are_404_before_406_before_400_and_mixed_units_are_refused()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        await server.AddStationAsync("volts", 40, unit: "dBuV");
        await (await server.Visitor.GetAsync("heatmap?station=nobody&month=2026-06", null)).ProblemAsync(HttpStatusCode.NotFound);
        await (await server.Visitor.GetAsync("heatmap?region=nowhere&month=never", "image/png")).ProblemAsync(HttpStatusCode.NotFound);
        await (await server.Visitor.GetAsync("heatmap?station=north&month=never", "image/png")).ProblemAsync(HttpStatusCode.NotAcceptable);
        await (await server.Visitor.GetAsync("heatmap?station=north&month=never", "*/*")).ProblemAsync(HttpStatusCode.BadRequest);

        await server.Coordinator.PutDayAsync("north", "2026-06-01", SampleBodies.Csv(SampleSheets.Make(1)));
        await server.Coordinator.PutDayAsync("volts", "2026-06-01", SampleBodies.Csv(SampleSheets.Make(2)));
        using var mixed = await server.Visitor.GetAsync("heatmap?region=all&month=2026-06&measure=level", null);
        Assert.Equal([(0, "region", "units-mixed")], await mixed.ProblemAsync(HttpStatusCode.BadRequest));
        Assert.Null(mixed.Headers.ETag);
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync("heatmap?region=all&month=2026-06&measure=excess", null)).StatusCode);
    }

    [Fact]
    public async Task Levels_that_must_not_be_compared_say_so()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        foreach (var code in new[] { "one", "two" })
        {
            await server.AddStationAsync(code, unit: "dBFS");
            await server.Coordinator.PutDayAsync(code, "2026-06-01", SampleBodies.Csv(SampleSheets.Make(code.Length)));
        }

        var level = await (await server.Visitor.GetAsync("heatmap?region=all&month=2026-06&measure=level", null)).JsonAsync();
        Assert.False(level["comparable"]!.GetValue<bool>());
        Assert.NotEmpty(level["reason"]!.GetValue<string>());
        var occupancy = (await (await server.Visitor.GetAsync("heatmap?region=all&month=2026-06", null)).JsonAsync()).AsObject();
        Assert.False(occupancy.ContainsKey("comparable"));
        Assert.False(occupancy.ContainsKey("reason"));
    }

    private static async Task<HttpStatusCode> StatusAsync(ServerHost server, string path, string ifNoneMatch)
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, path);
        request.Headers.TryAddWithoutValidation("If-None-Match", ifNoneMatch);
        using var response = await server.Visitor.SendAsync(request, Ct);
        return response.StatusCode;
    }

    private static async Task<IReadOnlyList<(string Station, JsonNode Sheet)>> FillAsync(ServerHost server)
    {
        var sheets = new List<(string, JsonNode)>();
        foreach (var (code, latitude, longitude, days) in Network)
        {
            await server.AddStationAsync(code, latitude, longitude);
            foreach (var day in days)
            {
                var date = string.Create(CultureInfo.InvariantCulture, $"2026-06-{day:00}");
                var presence = code is "next-door" ? 0.7 : 1;
                using var put = await server.Coordinator.PutDayAsync(code, date, SampleBodies.Csv(SampleSheets.Make(day + (code is "south" ? 100 : code is "north" ? 0 : 50), presence: presence)));
                Assert.Equal(HttpStatusCode.Created, put.StatusCode);
                sheets.Add((code, await (await server.Visitor.GetAsync($"stations/{code}/days/{date}", null)).JsonAsync()));
            }
        }

        return sheets;
    }

    private static async Task CompareAsync(ServerHost server, PlainPool plain, string query, string measure, string stat, int minDays = 1, int minSweeps = 1)
    {
        using var response = await server.Visitor.GetAsync($"heatmap?{query}", null);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        var answer = await response.JsonAsync();
        var bands = answer["bands"]!.AsArray().Select(band => band!.GetValue<string>()).ToList();
        Assert.Equal(4, bands.Count);
        for (var b = 0; b < bands.Count; b++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var (value, stations, days) = plain.Cell(bands[b], hour, measure, stat, minDays, minSweeps);
                Assert.Equal((stations, days), (answer["stations"]![b]![hour]!.GetValue<int>(), answer["days"]![b]![hour]!.GetValue<int>()));
                var got = answer["values"]![b]![hour]?.GetValue<double>();
                Assert.True(value is null ? got is null : Math.Abs(value.Value - got!.Value) < 1e-6, $"{query} {bands[b]} {hour}: {got} instead of {value}");
            }
        }
    }
}
