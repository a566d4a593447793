using System.Net;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

public sealed class CoverageTests
{
    private const string Header = "hour,band,sweeps,occupancy\n";

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Hours_cells_and_bands_are_told_per_station_and_date(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await server.AddStationAsync("north");
        await server.AddStationAsync("south", -30);
        await server.Coordinator.PutDayAsync("north", "2026-02-01", Header + "0,bc-49m,1,0\n0,bc-31m,1,0\n7,bc-49m,1,0\n");
        await server.Coordinator.PutDayAsync("south", "2026-02-28", Header + "23,mhz-05,1,0\n");
        await server.Coordinator.PutDayAsync("south", "2026-02-27", Header + "23,mhz-05,1,0\n");
        await server.Coordinator.DeleteAsync(new Uri("stations/south/days/2026-02-27", UriKind.Relative), Ct);

        var answer = await (await server.Visitor.GetAsync("coverage?region=all&month=2026-02", null)).JsonAsync();
        Assert.Equal(("2026-02-01", "2026-02-28"), (answer["from"]!.GetValue<string>(), answer["to"]!.GetValue<string>()));
        Assert.Equal(28, answer["dates"]!.AsArray().Count);
        Assert.Equal(["north", "south"], answer["stations"]!.AsArray().Select(code => code!.GetValue<string>()));
        Assert.Equal((2, 3, 2), At(answer, 0, 0));
        Assert.Equal((1, 1, 1), At(answer, 1, 27));
        Assert.Equal((0, 0, 0), At(answer, 1, 26));
        Assert.Null(answer["hours"]![0]![1]);

        using var csv = await server.Visitor.GetAsync("coverage?region=all&month=2026-02", "text/csv");
        Assert.Equal("station,date,hours,cells,bands,withdrawn\nnorth,2026-02-01,2,3,2,false\nsouth,2026-02-27,0,0,0,true\nsouth,2026-02-28,1,1,1,false\n", await csv.Content.ReadAsStringAsync(Ct));
        var range = await (await server.Visitor.GetAsync("coverage?station=south&from=2026-01&to=2026-03", null)).JsonAsync();
        Assert.Equal(90, range["dates"]!.AsArray().Count);
        Assert.Single(range["stations"]!.AsArray());
    }

    [Fact]
    public async Task Tags_and_representations_are_those_of_every_answer()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        const string path = "coverage?station=north&month=2026-02";
        using var json = await server.Visitor.GetAsync(path, null);
        using var csv = await server.Visitor.GetAsync(path + "&format=csv", null);
        Assert.Equal(("application/json", "text/csv"), (json.Content.Headers.ContentType?.MediaType, csv.Content.Headers.ContentType?.MediaType));
        Assert.NotEqual(json.Headers.ETag, csv.Headers.ETag);
        Assert.Equal(HttpStatusCode.NotModified, (await server.Visitor.GetAsync(path, null, json.Headers.ETag!.ToString())).StatusCode);
        await server.Coordinator.PutDayAsync("north", "2026-02-01", Header + "0,bc-49m,1,0\n");
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync(path, null, json.Headers.ETag!.ToString())).StatusCode);
        await (await server.Visitor.GetAsync(path, "image/png")).ProblemAsync(HttpStatusCode.NotAcceptable);
    }

    [Theory]
    [InlineData("month=2026-02", "region", "selection")]
    [InlineData("region=all&station=north&month=2026-02", "region", "selection")]
    [InlineData("region=all", "month", "period")]
    [InlineData("region=all&month=2026-02&from=2026-01&to=2026-02", "month", "period")]
    [InlineData("region=all&month=2026-2", "month", "month-syntax")]
    [InlineData("region=all&from=2026-02", "to", "month-syntax")]
    [InlineData("region=all&from=2026-02&to=2026-01", "to", "range-order")]
    [InlineData("region=all&from=2001-01&to=2026-01", "to", "range-order")]
    [InlineData("region=ALL&month=2026-02", "region", "code-syntax")]
    [InlineData("region=all&month=2026-02&format=svg", "format", "choice")]
    [InlineData("region=all&month=2026-02&mesure=occupancy", "mesure", "name-unknown")]
    public async Task A_query_that_cannot_be_meant_names_field_and_rule(string query, string field, string rule)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        Assert.Contains((0, field, rule), await (await server.Visitor.GetAsync($"coverage?{query}", null)).ProblemAsync(HttpStatusCode.BadRequest));
    }

    [Fact]
    public async Task Unknown_stations_and_regions_are_not_found()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await (await server.Visitor.GetAsync("coverage?station=nobody&month=2026-02", null)).ProblemAsync(HttpStatusCode.NotFound);
        await (await server.Visitor.GetAsync("coverage?region=nowhere&month=2026-02", null)).ProblemAsync(HttpStatusCode.NotFound);
        Assert.Empty((await (await server.Visitor.GetAsync("coverage?region=all&month=2026-02", null)).JsonAsync())["stations"]!.AsArray());
    }

    private static (int Hours, int Cells, int Bands) At(System.Text.Json.Nodes.JsonNode answer, int station, int day) =>
        (answer["hours"]![station]![day]!.GetValue<int>(), answer["cells"]![station]![day]!.GetValue<int>(), answer["bands"]![station]![day]!.GetValue<int>());
}
