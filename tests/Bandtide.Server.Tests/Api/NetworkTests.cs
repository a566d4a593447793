using System.Net;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>Bands, regions, stations, setups and keys over HTTP.</summary>
public sealed class NetworkTests
{
    [Fact]
    public async Task The_band_plan_is_listed_by_layer_and_frequency()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        var bands = (await (await server.Visitor.GetAsync("bands", null)).JsonAsync()).AsArray();
        foreach (var layer in bands.GroupBy(band => band!["layer"]!.GetValue<string>()))
        {
            var lows = layer.Select(band => band!["segments"]![0]!["lowKhz"]!.GetValue<double>()).ToList();
            Assert.Equal(lows.Order(), lows);
        }

        // Limits as the data contract prints them.
        var ama40 = await (await server.Visitor.GetAsync("bands/ama-40m", null)).JsonAsync();
        Assert.Equal((7000.0, 7200.0), (ama40["segments"]![0]!["lowKhz"]!.GetValue<double>(), ama40["segments"]![0]!["highKhz"]!.GetValue<double>()));
        var bc60 = await (await server.Visitor.GetAsync("bands/bc-60m", null)).JsonAsync();
        Assert.Equal([4750.0, 4995.0, 5005.0, 5060.0], bc60["segments"]!.AsArray().SelectMany(s => new[] { s!["lowKhz"]!.GetValue<double>(), s["highKhz"]!.GetValue<double>() }));
        Assert.Equal(30, bands.Count(band => band!["layer"]!.GetValue<string>() is "slice"));
        await (await server.Visitor.GetAsync("bands/bc-50m", null)).ProblemAsync(HttpStatusCode.NotFound);
        await (await server.Visitor.GetAsync("bands/BC-49M", null)).ProblemAsync(HttpStatusCode.BadRequest);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_station_is_registered_once_and_shows_only_its_square(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        using var created = await PostAsync(server, "stations", """{"code":"north-hut","name":"North hut","latitude":53.9,"longitude":27.56,"levelUnit":"dBuV/m"}""");
        Assert.Equal(HttpStatusCode.Created, created.StatusCode);
        Assert.Equal("/api/v1/stations/north-hut", created.Headers.Location?.ToString());
        var answer = await created.JsonAsync();
        Assert.True(answer["key"]!.GetValue<string>().Length >= 32);

        using var shown = await server.Visitor.GetAsync("stations/north-hut", null);
        var text = await shown.Content.ReadAsStringAsync(Ct);
        var station = JsonNode.Parse(text)!;
        Assert.Equal(("KO33", "dBuV/m", 1), (station["locator"]!.GetValue<string>(), station["levelUnit"]!.GetValue<string>(), station["ituRegion"]!.GetValue<int>()));
        Assert.Equal(["all", "field-ko", "itu-1", "square-ko33"], station["regions"]!.AsArray().Select(code => code!.GetValue<string>()).Order(StringComparer.Ordinal));
        Assert.DoesNotContain("53.9", text, StringComparison.Ordinal);
        Assert.DoesNotContain("27.5", text, StringComparison.Ordinal);

        await (await PostAsync(server, "stations", """{"code":"north-hut","name":"Another","latitude":1,"longitude":1,"levelUnit":"dBm"}""")).ProblemAsync(HttpStatusCode.Conflict);
        await (await server.Visitor.GetAsync("stations/south-hut", null)).ProblemAsync(HttpStatusCode.NotFound);
    }

    [Theory]
    [InlineData("""{"code":"N","name":"x","latitude":1,"longitude":1,"levelUnit":"dBm"}""", "code", "code-syntax")]
    [InlineData("""{"code":"north hut","name":"x","latitude":1,"longitude":1,"levelUnit":"dBm"}""", "code", "code-syntax")]
    [InlineData("""{"code":"a-code-of-twenty-five-char","name":"x","latitude":1,"longitude":1,"levelUnit":"dBm"}""", "code", "code-syntax")]
    [InlineData("""{"name":"x","latitude":1,"longitude":1,"levelUnit":"dBm"}""", "code", "code-syntax")]
    [InlineData("""{"code":"north","latitude":1,"longitude":1,"levelUnit":"dBm"}""", "name", "value-missing")]
    [InlineData("""{"code":"north","name":"a\u0007b","latitude":1,"longitude":1,"levelUnit":"dBm"}""", "name", "text-syntax")]
    [InlineData("""{"code":"north","name":"x","latitude":90.1,"longitude":1,"levelUnit":"dBm"}""", "latitude", "range")]
    [InlineData("""{"code":"north","name":"x","longitude":1,"levelUnit":"dBm"}""", "latitude", "value-missing")]
    [InlineData("""{"code":"north","name":"x","latitude":1,"longitude":-180.5,"levelUnit":"dBm"}""", "longitude", "range")]
    [InlineData("""{"code":"north","name":"x","latitude":1,"longitude":1,"levelUnit":"S-units"}""", "levelUnit", "choice")]
    [InlineData("""{"code":"north","name":"x","latitude":1,"longitude":1}""", "levelUnit", "value-missing")]
    [InlineData("""{"code":"north","name":"x","latitude":"1","longitude":1,"levelUnit":"dBm"}""", "latitude", "json-syntax")]
    [InlineData("""{"code":"north","name":"x","latitude":1,"longitude":1,"levelUnit":"dBm","regions":["nowhere"]}""", "regions", "region-unknown")]
    [InlineData("""{"code":"north","name":"x","latitude":1,"longitude":1,"levelUnit":"dBm","regions":["field-ko"]}""", "regions", "region-unknown")]
    [InlineData("""[1]""", "", "json-syntax")]
    [InlineData("""{"code":"north",""", "", "json-syntax")]
    [InlineData("null", "", "json-syntax")]
    public async Task A_station_that_cannot_be_is_refused_and_names_the_field(string body, string field, string rule)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        Assert.Contains((0, field, rule), await (await PostAsync(server, "stations", body)).ProblemAsync(HttpStatusCode.BadRequest));
        Assert.Empty((await (await server.Visitor.GetAsync("stations", null)).JsonAsync()).AsArray());
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Regions_are_lists_or_locators_and_select_stations(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await server.AddStationAsync("minsk", 53.9, 27.56);
        await server.AddStationAsync("riga", 56.9, 24.1);
        await server.AddStationAsync("perth", -31.9, 115.9);
        Assert.Equal(HttpStatusCode.Created, (await PostAsync(server, "regions", """{"code":"pair","name":"Pair","stations":["minsk","perth"]}""")).StatusCode);
        using var made = await PostAsync(server, "regions", """{"code":"baltic","name":"Baltic","locators":["ko"]}""");
        Assert.Equal("/api/v1/regions/baltic", made.Headers.Location?.ToString());

        Assert.Equal(["minsk", "riga"], (await made.JsonAsync())["stations"]!.AsArray().Select(code => code!.GetValue<string>()));
        Assert.Equal("minsk,perth", await CodesAsync(server, "stations?region=pair"));
        Assert.Equal("minsk,riga", await CodesAsync(server, "stations?region=field-ko"));
        Assert.Equal("perth", await CodesAsync(server, "stations?region=itu-3"));
        Assert.Equal("minsk,perth,riga", await CodesAsync(server, "stations"));
        var regions = (await (await server.Visitor.GetAsync("regions", null)).JsonAsync()).AsArray().Select(region => region!["code"]!.GetValue<string>()).ToList();
        Assert.Superset(new HashSet<string>(["all", "itu-1", "itu-3", "field-ko", "field-of", "square-ko33", "square-ko26", "pair", "baltic"], StringComparer.Ordinal), regions.ToHashSet(StringComparer.Ordinal));

        await (await PostAsync(server, "regions", """{"code":"pair","name":"Again","stations":["riga"]}""")).ProblemAsync(HttpStatusCode.Conflict);
        await (await PostAsync(server, "regions", """{"code":"itu-2","name":"Kept","stations":["riga"]}""")).ProblemAsync(HttpStatusCode.Conflict);
        await (await server.Visitor.GetAsync("stations?region=nowhere", null)).ProblemAsync(HttpStatusCode.NotFound);
        await (await server.Visitor.GetAsync("stations?region=No+where", null)).ProblemAsync(HttpStatusCode.BadRequest);
        await (await server.Visitor.GetAsync("regions/nowhere", null)).ProblemAsync(HttpStatusCode.NotFound);
    }

    [Theory]
    [InlineData("""{"code":"x","name":"X","stations":[]}""", "code", "code-syntax")]
    [InlineData("""{"code":"list","stations":["north"]}""", "name", "value-missing")]
    [InlineData("""{"code":"list","name":"X"}""", "stations", "members")]
    [InlineData("""{"code":"list","name":"X","stations":["north"],"locators":["KO"]}""", "stations", "members")]
    [InlineData("""{"code":"list","name":"X","stations":["north","nobody"]}""", "stations", "station-unknown")]
    [InlineData("""{"code":"list","name":"X","locators":["K"]}""", "locators", "locator-syntax")]
    [InlineData("""{"code":"list","name":"X","locators":["KO33aa"]}""", "locators", "locator-syntax")]
    [InlineData("""{"code":"list","name":"X","locators":[null]}""", "stations", "value-missing")]
    public async Task A_region_that_cannot_be_is_refused_and_names_the_field(string body, string field, string rule)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        Assert.Contains((0, field, rule), await (await PostAsync(server, "regions", body)).ProblemAsync(HttpStatusCode.BadRequest));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Setups_are_told_and_silence_the_warning_of_a_day_without_one(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        using var station = server.Client(await server.AddStationAsync("north"));
        const string setup = """{"validFrom":"2026-02-01","threshold":"floor+margin","marginDb":6.5,"averages":8,"detector":"log","resolutionHz":1000,"noiseBandwidthHz":1500,"revisitSeconds":5,"antennaFactorDb":-3,"environment":"quiet-rural","receiver":"r","antenna":"a","note":"n"}""";
        using var made = await station.PostAsync(new Uri("stations/north/setups", UriKind.Relative), Body(setup, "application/json"), Ct);
        Assert.Equal(HttpStatusCode.Created, made.StatusCode);
        var shown = await (await server.Visitor.GetAsync("stations/north", null)).JsonAsync();
        Assert.True(JsonNode.DeepEquals(JsonNode.Parse(setup), Assert.Single(shown["setups"]!.AsArray())));

        const string day = "hour,band,sweeps,occupancy\n0,bc-49m,1,0\n";
        Assert.Empty((await (await station.PutDayAsync("north", "2026-02-01", day)).JsonAsync())["warnings"]!.AsArray());
        Assert.Equal("before-first-setup", (await (await station.PutDayAsync("north", "2026-01-31", day)).JsonAsync())["warnings"]![0]!["rule"]!.GetValue<string>());
    }

    [Theory]
    [InlineData("""{"threshold":"fixed"}""", "validFrom", "date-syntax")]
    [InlineData("""{"validFrom":"1949-12-31"}""", "validFrom", "date-syntax")]
    [InlineData("""{"validFrom":"2026-02-01","threshold":"guess"}""", "threshold", "choice")]
    [InlineData("""{"validFrom":"2026-02-01","marginDb":-1}""", "marginDb", "range")]
    [InlineData("""{"validFrom":"2026-02-01","averages":0}""", "averages", "range")]
    [InlineData("""{"validFrom":"2026-02-01","averages":1.5}""", "averages", "json-syntax")]
    [InlineData("""{"validFrom":"2026-02-01","detector":"ear"}""", "detector", "choice")]
    [InlineData("""{"validFrom":"2026-02-01","resolutionHz":0}""", "resolutionHz", "range")]
    [InlineData("""{"validFrom":"2026-02-01","noiseBandwidthHz":-5}""", "noiseBandwidthHz", "range")]
    [InlineData("""{"validFrom":"2026-02-01","revisitSeconds":90000}""", "revisitSeconds", "range")]
    [InlineData("""{"validFrom":"2026-02-01","antennaFactorDb":1e9}""", "antennaFactorDb", "range")]
    [InlineData("""{"validFrom":"2026-02-01","environment":"moon"}""", "environment", "choice")]
    [InlineData("""{"validFrom":"2026-02-01","receiver":"a\u0000b"}""", "receiver", "text-syntax")]
    public async Task A_setup_that_cannot_be_is_refused_and_names_the_field(string body, string field, string rule)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        Assert.Equal([(0, field, rule)], await (await PostAsync(server, "stations/north/setups", body)).ProblemAsync(HttpStatusCode.BadRequest));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task An_operator_rotates_and_revokes_his_own_keys(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        var first = await server.AddStationAsync("north");
        using var old = server.Client(first);
        using var made = await old.PostAsync(new Uri("stations/north/keys", UriKind.Relative), null, Ct);
        Assert.Equal(HttpStatusCode.Created, made.StatusCode);
        var answer = await made.JsonAsync();
        using var fresh = server.Client(answer["key"]!.GetValue<string>());
        Assert.NotEqual(first, answer["key"]!.GetValue<string>());

        using var listing = await fresh.GetAsync("stations/north/keys", null);
        var text = await listing.Content.ReadAsStringAsync(Ct);
        var keys = JsonNode.Parse(text)!.AsArray();
        Assert.Equal(2, keys.Count);
        Assert.DoesNotContain(first, text, StringComparison.Ordinal);
        var oldId = keys.Select(key => key!["id"]!.GetValue<int>()).Min();
        Assert.Equal(HttpStatusCode.NoContent, (await fresh.DeleteAsync(new Uri($"stations/north/keys/{oldId}", UriKind.Relative), Ct)).StatusCode);
        await (await old.PutDayAsync("north", "2026-02-01", "hour,band,sweeps,occupancy\n0,bc-49m,1,0\n")).ProblemAsync(HttpStatusCode.Unauthorized);
        Assert.Equal(HttpStatusCode.Created, (await fresh.PutDayAsync("north", "2026-02-01", "hour,band,sweeps,occupancy\n0,bc-49m,1,0\n")).StatusCode);
        await (await fresh.DeleteAsync(new Uri($"stations/north/keys/{oldId}", UriKind.Relative), Ct)).ProblemAsync(HttpStatusCode.NotFound);
        await (await fresh.DeleteAsync(new Uri("stations/north/keys/first", UriKind.Relative), Ct)).ProblemAsync(HttpStatusCode.BadRequest);
    }

    private static Task<HttpResponseMessage> PostAsync(ServerHost server, string path, string body) =>
        server.Coordinator.PostAsync(new Uri(path, UriKind.Relative), Body(body, "application/json"), Ct);

    private static async Task<string> CodesAsync(ServerHost server, string path) =>
        string.Join(",", (await (await server.Visitor.GetAsync(path, null)).JsonAsync()).AsArray().Select(station => station!["code"]!.GetValue<string>()));
}
