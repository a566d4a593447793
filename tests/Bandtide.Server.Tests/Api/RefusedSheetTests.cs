using System.Globalization;
using System.Net;
using System.Text;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>Everything the data contract refuses in a day sheet, as CSV and JSON, alone and among many days: line, field and rule are named, nothing is stored.</summary>
public sealed class RefusedSheetTests
{
    private const string Header = "hour,band,sweeps,occupancy,signal,level,level_p90,floor,steady,coverage\n";

    // The bad row stands on line 3, behind a good one.
    [Theory]
    [InlineData("24,bc-49m,1,0,,,,,,", "hour", "hour-range")]
    [InlineData("-1,bc-49m,1,0,,,,,,", "hour", "hour-range")]
    [InlineData("1.5,bc-49m,1,0,,,,,,", "hour", "hour-range")]
    [InlineData("one,bc-49m,1,0,,,,,,", "hour", "hour-range")]
    [InlineData(",bc-49m,1,0,,,,,,", "hour", "value-missing")]
    [InlineData("1,bc-50m,1,0,,,,,,", "band", "band-unknown")]
    [InlineData("1,,1,0,,,,,,", "band", "value-missing")]
    [InlineData("1,bc-49m,0,0,,,,,,", "sweeps", "sweeps-range")]
    [InlineData("1,bc-49m,1000001,0,,,,,,", "sweeps", "sweeps-range")]
    [InlineData("1,bc-49m,2.5,0,,,,,,", "sweeps", "sweeps-range")]
    [InlineData("1,bc-49m,,0,,,,,,", "sweeps", "value-missing")]
    [InlineData("1,bc-49m,1,,,,,,,", "occupancy", "value-missing")]
    [InlineData("1,bc-49m,1,1.01,,,,,,", "occupancy", "share-range")]
    [InlineData("1,bc-49m,1,-0.1,,,,,,", "occupancy", "share-range")]
    [InlineData("1,bc-49m,1,NaN,,,,,,", "occupancy", "not-finite")]
    [InlineData("1,bc-49m,1,half,,,,,,", "occupancy", "number-syntax")]
    [InlineData("1,bc-49m,1,0,-301,,,,,", "signal", "decibel-range")]
    [InlineData("1,bc-49m,1,0,Infinity,,,,,", "signal", "not-finite")]
    [InlineData("1,bc-49m,1,0,,300.5,,,,", "level", "decibel-range")]
    [InlineData("1,bc-49m,1,0,,-90,-90.5,,,", "level_p90", "p90-below-level")]
    [InlineData("1,bc-49m,1,0,,,,-inf,,", "floor", "not-finite")]
    [InlineData("1,bc-49m,1,0,,,,,2,", "steady", "share-range")]
    [InlineData("1,bc-49m,1,0,,,,,,1.5", "coverage", "share-range")]
    [InlineData("0,bc-49m,1,0,,,,,,", "band", "cell-twice")]
    [InlineData("1,bc-49m,1,0", "", "field-count")]
    [InlineData("1,\"bc\"-49m,1,0,,,,,,", "", "quote-syntax")]
    public async Task A_bad_row_of_csv_names_line_field_and_rule(string row, string field, string rule)
    {
        await using var server = await StartAsync();
        var body = Header + "0,bc-49m,1,0,,,,,,\n" + row + "\n";
        Assert.Contains((3, field, rule), await (await server.Coordinator.PutDayAsync("north", "2026-01-01", body)).ProblemAsync(HttpStatusCode.BadRequest));

        var many = string.Join("\n", body.TrimEnd('\n').Split('\n').Select((line, i) => i == 0 ? "date," + line : "2026-01-01," + line)) + "\n2026-01-02,0,bc-49m,1,0,,,,,,\n";
        var lines = await server.Coordinator.PostDaysAsync("north", many);
        Assert.Equal("2026-01-01 refused,2026-01-02 created", string.Join(",", lines.Select(line => $"{line["date"]} {line["status"]}")));
        Assert.Contains((3, field, rule), Errors(lines[0]));
        await NothingStoredAsync(server);
    }

    // The bad cell is the second.
    [Theory]
    [InlineData("""{"hour":24,"band":"bc-49m","sweeps":1,"occupancy":0}""", "hour", "hour-range")]
    [InlineData("""{"hour":"1","band":"bc-49m","sweeps":1,"occupancy":0}""", "hour", "number-syntax")]
    [InlineData("""{"band":"bc-49m","sweeps":1,"occupancy":0}""", "hour", "value-missing")]
    [InlineData("""{"hour":1,"band":"nowhere","sweeps":1,"occupancy":0}""", "band", "band-unknown")]
    [InlineData("""{"hour":1,"sweeps":1,"occupancy":0}""", "band", "value-missing")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":0,"occupancy":0}""", "sweeps", "sweeps-range")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1}""", "occupancy", "value-missing")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":null}""", "occupancy", "value-missing")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":1.2}""", "occupancy", "share-range")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":0,"signal":"NaN"}""", "signal", "not-finite")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":0,"level":1e3}""", "level", "decibel-range")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":0,"level":-90,"levelP90":-91}""", "levelP90", "p90-below-level")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":0,"floor":-300.1}""", "floor", "decibel-range")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":0,"steady":-1}""", "steady", "share-range")]
    [InlineData("""{"hour":1,"band":"bc-49m","sweeps":1,"occupancy":0,"coverage":2}""", "coverage", "share-range")]
    [InlineData("""{"hour":0,"band":"bc-49m","sweeps":1,"occupancy":0}""", "band", "cell-twice")]
    [InlineData("""{"hour":1,"hour":2,"band":"bc-49m","sweeps":1,"occupancy":0}""", "hour", "column-twice")]
    [InlineData("7", "cells", "json-syntax")]
    public async Task A_bad_cell_of_json_names_place_field_and_rule(string cell, string field, string rule)
    {
        await using var server = await StartAsync();
        var body = $$"""{"date":"2026-01-01","cells":[{"hour":0,"band":"bc-49m","sweeps":1,"occupancy":0},{{cell}}]}""";
        Assert.Contains((2, field, rule), await (await PutJsonAsync(server, body)).ProblemAsync(HttpStatusCode.BadRequest));
        var line = Assert.Single(await server.Coordinator.PostDaysAsync("north", body + "\n", "application/x-ndjson"));
        Assert.Equal("2026-01-01 refused", $"{line["date"]} {line["status"]}");
        Assert.Contains((2, field, rule), Errors(line));
        await NothingStoredAsync(server);
    }

    [Theory]
    [InlineData("", 1, "", "header-missing")]
    [InlineData("hour,band,sweeps\n0,bc-49m,1\n", 1, "occupancy", "column-missing")]
    [InlineData("hour,band,sweeps,occupancy,hour\n0,bc-49m,1,0,0\n", 1, "hour", "column-twice")]
    [InlineData("hour,band,sweeps,occupancy\n", 0, "", "no-cells")]
    [InlineData("hour,band,sweeps,occupancy\n0,\"bc-49m,1,0\n", 2, "", "quote-unclosed")]
    [InlineData("date,hour,band,sweeps,occupancy\n2026-01-02,0,bc-49m,1,0\n", 2, "date", "date-mismatch")]
    [InlineData("hour;band;sweeps;occupancy\n0;bc-49m;1;0\n", 1, "hour", "column-missing")]
    [InlineData("hour,band,sweeps,occupancy\n0,bc-49m,1,0,5\n", 2, "", "field-count")]
    public async Task A_bad_csv_body_names_line_field_and_rule(string body, int line, string field, string rule)
    {
        await using var server = await StartAsync();
        Assert.Contains((line, field, rule), await (await server.Coordinator.PutDayAsync("north", "2026-01-01", body)).ProblemAsync(HttpStatusCode.BadRequest));
        await NothingStoredAsync(server);
    }

    [Theory]
    [InlineData("", "", "json-syntax")]
    [InlineData("[]", "", "json-syntax")]
    [InlineData("{\"cells\":", "", "json-syntax")]
    [InlineData("{\"cells\":[]} x", "", "json-syntax")]
    [InlineData("{\"date\":\"2026-01-01\"}", "", "no-cells")]
    [InlineData("{\"date\":\"2026-01-01\",\"cells\":[]}", "", "no-cells")]
    [InlineData("{\"date\":\"2026-01-01\",\"cells\":{}}", "cells", "json-syntax")]
    [InlineData("{\"date\":\"2026-01-02\",\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":0}]}", "date", "date-mismatch")]
    public async Task A_bad_json_body_names_field_and_rule(string body, string field, string rule)
    {
        await using var server = await StartAsync();
        Assert.Contains((0, field, rule), await (await PutJsonAsync(server, body)).ProblemAsync(HttpStatusCode.BadRequest));
        await NothingStoredAsync(server);
    }

    [Fact]
    public async Task Text_that_is_not_utf8_is_refused()
    {
        await using var server = await StartAsync();
        foreach (var type in new[] { "text/csv", "application/json" })
        {
            using var content = new ByteArrayContent([.. Encoding.ASCII.GetBytes(type is "text/csv" ? Header + "0,bc-49m,1,0,,,,,," : "{\"cells\":\""), 0xC3, 0x28, .. Encoding.ASCII.GetBytes(type is "text/csv" ? "\n" : "\"}")]);
            content.Headers.ContentType = new(type);
            using var response = await server.Coordinator.PutAsync(new Uri("stations/north/days/2026-01-01", UriKind.Relative), content, Ct);
            Assert.Contains("utf8", (await response.ProblemAsync(HttpStatusCode.BadRequest)).Select(error => error.Rule));
        }
    }

    // The clock of the server decides: half past noon of 2026-06-01.
    [Theory]
    [InlineData("1949-12-31", 0, "date", "date-range")]
    [InlineData("2026-06-02", 0, "date", "date-range")]
    [InlineData("2026-06-01", 12, "hour", "hour-not-ended")]
    [InlineData("2026-06-01", 23, "hour", "hour-not-ended")]
    [InlineData("2026-02-30", 0, "date", "date-syntax")]
    [InlineData("2026-6-1", 0, "date", "date-syntax")]
    [InlineData("tomorrow", 0, "date", "date-syntax")]
    public async Task A_time_that_cannot_have_been_observed_is_refused(string date, int hour, string field, string rule)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite, Noon(30));
        await server.AddStationAsync("north");
        var body = string.Create(CultureInfo.InvariantCulture, $"hour,band,sweeps,occupancy\n{hour},bc-49m,1,0\n");
        var errors = await (await server.Coordinator.PutDayAsync("north", date, body)).ProblemAsync(HttpStatusCode.BadRequest);
        Assert.Contains((field, rule), errors.Select(error => (error.Field, error.Rule)));
        var lines = await server.Coordinator.PostDaysAsync("north", $"date,hour,band,sweeps,occupancy\n{date},{hour},bc-49m,1,0\n");
        Assert.Contains((2, field, rule), Errors(Assert.Single(lines)));
        Assert.Equal(date, lines[0]["date"]!.GetValue<string>());
    }

    [Theory]
    [InlineData(54, 12, HttpStatusCode.BadRequest)]
    [InlineData(55, 12, HttpStatusCode.Created)]
    [InlineData(0, 11, HttpStatusCode.Created)]
    public async Task An_hour_may_be_sent_from_five_minutes_before_its_end(int minute, int hour, HttpStatusCode status)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite, Noon(minute));
        await server.AddStationAsync("north");
        var body = string.Create(CultureInfo.InvariantCulture, $"hour,band,sweeps,occupancy\n{hour},bc-49m,1,0\n");
        Assert.Equal(status, (await server.Coordinator.PutDayAsync("north", "2026-06-01", body)).StatusCode);
    }

    [Fact]
    public async Task Every_error_is_told_up_to_a_hundred()
    {
        await using var server = await StartAsync();
        var body = new StringBuilder("hour,band,sweeps,occupancy\n");
        for (var i = 0; i < 150; i++)
        {
            body.Append(CultureInfo.InvariantCulture, $"{i % 24},bc-49m,0,0\n");
        }

        var errors = await (await server.Coordinator.PutDayAsync("north", "2026-01-01", body.ToString())).ProblemAsync(HttpStatusCode.BadRequest);
        Assert.Equal(100, errors.Count);
        Assert.Equal(Enumerable.Range(2, 100), errors.Select(error => error.Line));
    }

    [Fact]
    public async Task Suspicious_content_is_stored_and_warned_about_once_per_rule()
    {
        await using var server = await StartAsync();
        const string body = Header + "0,bc-49m,1,0.2,-99,-90,-80,-120,,\n1,bc-49m,1,0.2,-99,-90,-80,-120,,\n";
        await server.Coordinator.PutDayAsync("north", "2026-01-01", body);
        using var response = await server.Coordinator.PutDayAsync("north", "2026-01-02", body.Replace("coverage\n", "coverage,colour\n", StringComparison.Ordinal).Replace(",,\n", ",,,red\n", StringComparison.Ordinal));
        Assert.Equal(HttpStatusCode.Created, response.StatusCode);
        var warnings = (await response.JsonAsync())["warnings"]!.AsArray().ToDictionary(warning => warning!["rule"]!.GetValue<string>(), warning => warning!, StringComparer.Ordinal);
        Assert.Equal(["column-unknown", "copied-day", "level-above-threshold", "no-setup", "signal-below-level"], warnings.Keys.Order(StringComparer.Ordinal));
        Assert.Equal((2, 0, "bc-49m"), (warnings["signal-below-level"]["count"]!.GetValue<int>(), warnings["signal-below-level"]["hour"]!.GetValue<int>(), warnings["signal-below-level"]["band"]!.GetValue<string>()));
        Assert.All(warnings.Values, warning => Assert.NotEmpty(warning["message"]!.GetValue<string>()));
    }

    private static SettableClock Noon(int minute) => new(new(2026, 6, 1, 12, minute, 0, TimeSpan.Zero));

    private static async Task<ServerHost> StartAsync()
    {
        var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        return server;
    }

    private static Task<HttpResponseMessage> PutJsonAsync(ServerHost server, string body) =>
        server.Coordinator.PutAsync(new Uri("stations/north/days/2026-01-01", UriKind.Relative), Body(body, "application/json"), Ct);

    private static async Task NothingStoredAsync(ServerHost server) =>
        await (await server.Visitor.GetAsync("stations/north/days/2026-01-01", null)).ProblemAsync(HttpStatusCode.NotFound);

    private static IEnumerable<(int Line, string Field, string Rule)> Errors(JsonNode line) =>
        line["errors"]!.AsArray().Select(error => (error!["line"]!.GetValue<int>(), error["field"]!.GetValue<string>(), error["rule"]!.GetValue<string>()));
}
