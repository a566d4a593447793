using System.IO.Compression;
using System.Net;
using System.Net.Http.Headers;
using System.Text;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>The data contract's calls for one day, each on both databases.</summary>
public sealed class DayContractTests
{
    private const string Csv = "hour,band,sweeps,occupancy,signal,level,level_p90,floor,steady,coverage\n0,bc-49m,720,0.4312,-78.60,-96.10,-70.35,-98.40,0.02,1\n";
    private const string Other = "hour,band,sweeps,occupancy\n0,bc-49m,720,0.5\n";

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_day_is_created_replaced_unchanged_withdrawn_and_created_again(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        var key = await server.AddStationAsync("north");
        using var station = server.Client(key);

        using var created = await station.PutDayAsync("north", "2026-06-01", Csv);
        Assert.Equal(HttpStatusCode.Created, created.StatusCode);
        var receipt = await created.JsonAsync();
        Assert.Equal(("north", "2026-06-01", "created", 1, 1), (receipt["station"]!.GetValue<string>(), receipt["date"]!.GetValue<string>(), receipt["status"]!.GetValue<string>(), receipt["revision"]!.GetValue<int>(), receipt["cells"]!.GetValue<int>()));
        Assert.Equal("no-setup", receipt["warnings"]![0]!["rule"]!.GetValue<string>());

        await ReceiptIsAsync(await station.PutDayAsync("north", "2026-06-01", Csv), HttpStatusCode.OK, "unchanged", 1);
        await ReceiptIsAsync(await station.PutDayAsync("north", "2026-06-01", Other), HttpStatusCode.OK, "replaced", 2);
        Assert.Equal(HttpStatusCode.NoContent, (await station.DeleteAsync(new Uri("stations/north/days/2026-06-01", UriKind.Relative), Ct)).StatusCode);
        await (await station.DeleteAsync(new Uri("stations/north/days/2026-06-01", UriKind.Relative), Ct)).ProblemAsync(HttpStatusCode.Gone);
        await (await server.Visitor.GetAsync("stations/north/days/2026-06-01", null)).ProblemAsync(HttpStatusCode.Gone);
        await ReceiptIsAsync(await station.PutDayAsync("north", "2026-06-01", Other), HttpStatusCode.Created, "created", 4);

        var revisions = (await (await server.Visitor.GetAsync("stations/north/days/2026-06-01/revisions", null)).JsonAsync()).AsArray();
        Assert.Equal("1 stored,2 stored,3 withdrawn,4 stored", string.Join(",", revisions.Select(entry => $"{entry!["revision"]} {entry["status"]}")));
        Assert.Equal(HttpStatusCode.OK, (await server.Visitor.GetAsync("stations/north/days/2026-06-01?revision=1", null)).StatusCode);
        await (await server.Visitor.GetAsync("stations/north/days/2026-06-01?revision=3", null)).ProblemAsync(HttpStatusCode.Gone);
        await (await server.Visitor.GetAsync("stations/north/days/2026-06-01?revision=9", null)).ProblemAsync(HttpStatusCode.NotFound);
        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task What_was_sent_is_read_back_as_csv_and_json_and_sent_again_is_unchanged(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await server.AddStationAsync("north");
        await server.Coordinator.PutDayAsync("north", "2026-06-01", Csv);
        using var csv = await server.Visitor.GetAsync("stations/north/days/2026-06-01", "text/csv");
        Assert.Equal(Csv.Replace("0.02,1\n", "0.0200,1.0000\n", StringComparison.Ordinal), await csv.Content.ReadAsStringAsync(Ct));
        using var json = await server.Visitor.GetAsync("stations/north/days/2026-06-01", null);
        Assert.Equal("application/json", json.Content.Headers.ContentType?.MediaType);
        Assert.NotEqual(csv.Headers.ETag, json.Headers.ETag);
        Assert.Contains("Accept", json.Headers.Vary);
        using var again = await server.Coordinator.PutAsync(
            new Uri("stations/north/days/2026-06-01", UriKind.Relative), Body(await json.Content.ReadAsStringAsync(Ct), "application/json"), Ct);
        Assert.Equal("unchanged", (await again.JsonAsync())["status"]!.GetValue<string>());
        using var fresh = await server.Visitor.GetAsync("stations/north/days/2026-06-01", null, json.Headers.ETag!.ToString());
        Assert.Equal(HttpStatusCode.NotModified, fresh.StatusCode);
    }

    [Fact]
    public async Task Requests_are_judged_in_the_contracts_order()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        using var other = server.Client(await server.AddStationAsync("south", -30));
        using var unknown = server.Client("no-such-key-no-such-key-no-such-key");
        var bad = Body("nonsense", "text/plain");

        // 401 before 404, 404 before 403, 403 before 415, 415 before 400, 406 before 400.
        await (await server.Visitor.PutAsync(new Uri("stations/nowhere/days/x", UriKind.Relative), bad, Ct)).ProblemAsync(HttpStatusCode.Unauthorized);
        await (await unknown.GetAsync(new Uri("bands", UriKind.Relative), Ct)).ProblemAsync(HttpStatusCode.Unauthorized);
        await (await other.PutAsync(new Uri("stations/nowhere/days/x", UriKind.Relative), bad, Ct)).ProblemAsync(HttpStatusCode.NotFound);
        await (await other.PutAsync(new Uri("stations/north/days/x", UriKind.Relative), bad, Ct)).ProblemAsync(HttpStatusCode.Forbidden);
        await (await server.Coordinator.PutAsync(new Uri("stations/north/days/x", UriKind.Relative), bad, Ct)).ProblemAsync(HttpStatusCode.UnsupportedMediaType);
        using var picky = new HttpRequestMessage(HttpMethod.Put, "stations/north/days/x") { Content = Body("nonsense") };
        picky.Headers.Accept.Add(new MediaTypeWithQualityHeaderValue("image/png"));
        await (await server.Coordinator.SendAsync(picky, Ct)).ProblemAsync(HttpStatusCode.NotAcceptable);
        Assert.Equal((0, "date", "date-syntax"), Assert.Single(await (await server.Coordinator.PutDayAsync("north", "x", "nonsense")).ProblemAsync(HttpStatusCode.BadRequest)));
        Assert.Equal((0, "code", "code-syntax"), Assert.Single(await (await server.Visitor.GetAsync("stations/NORTH", null)).ProblemAsync(HttpStatusCode.BadRequest)));
        await (await server.Visitor.GetAsync("stations/north/days/2026-06-01", null)).ProblemAsync(HttpStatusCode.NotFound);
        await (await server.Visitor.GetAsync("no/such/thing", null)).ProblemAsync(HttpStatusCode.NotFound);
    }

    [Fact]
    public async Task A_bad_sheet_names_every_line_field_and_rule_and_stores_nothing()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var errors = await (await server.Coordinator.PutDayAsync("north", "2026-06-01", "hour,band,sweeps,occupancy\n0,bc-49m,720,7\n24,nowhere,0,0.5\n")).ProblemAsync(HttpStatusCode.BadRequest);
        Assert.Equal([(2, "occupancy", "share-range"), (3, "hour", "hour-range"), (3, "band", "band-unknown"), (3, "sweeps", "sweeps-range")], errors);
        await (await server.Visitor.GetAsync("stations/north/days/2026-06-01", null)).ProblemAsync(HttpStatusCode.NotFound);
    }

    [Fact]
    public async Task Size_charset_and_encoding_are_limited()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var path = new Uri("stations/north/days/2026-06-01", UriKind.Relative);
        await (await server.Coordinator.PutAsync(path, Body(Csv + new string('\n', 2_000_000)), Ct)).ProblemAsync(HttpStatusCode.RequestEntityTooLarge);

        using var packed = new ByteArrayContent(Gzip(Csv));
        packed.Headers.ContentType = new("text/csv") { CharSet = "UTF-8" };
        packed.Headers.ContentEncoding.Add("gzip");
        Assert.Equal(HttpStatusCode.Created, (await server.Coordinator.PutAsync(path, packed, Ct)).StatusCode);

        using var bomb = new ByteArrayContent(Gzip(new string('x', 50_000_000)));
        bomb.Headers.ContentType = new("text/csv");
        bomb.Headers.ContentEncoding.Add("gzip");
        await (await server.Coordinator.PutAsync(path, bomb, Ct)).ProblemAsync(HttpStatusCode.RequestEntityTooLarge);

        using var broken = new ByteArrayContent(Gzip(Csv)[..40]);
        broken.Headers.ContentType = new("text/csv");
        broken.Headers.ContentEncoding.Add("gzip");
        await (await server.Coordinator.PutAsync(path, broken, Ct)).ProblemAsync(HttpStatusCode.BadRequest);

        using var latin = new StringContent(Csv, Encoding.Latin1, "text/csv");
        await (await server.Coordinator.PutAsync(path, latin, Ct)).ProblemAsync(HttpStatusCode.UnsupportedMediaType);
        using var brotli = Body(Csv);
        brotli.Headers.ContentEncoding.Add("br");
        await (await server.Coordinator.PutAsync(path, brotli, Ct)).ProblemAsync(HttpStatusCode.UnsupportedMediaType);
    }

    [Fact]
    public async Task Listed_days_carry_the_receipts_checksums()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var first = await (await server.Coordinator.PutDayAsync("north", "2026-06-01", Csv)).JsonAsync();
        await server.Coordinator.PutDayAsync("north", "2026-06-05", Other);
        var listed = (await (await server.Visitor.GetAsync("stations/north/days?from=2026-06-01&to=2026-06-04", null)).JsonAsync()).AsArray();
        var entry = Assert.Single(listed)!;
        Assert.Equal(("2026-06-01", first["checksum"]!.GetValue<string>(), 1), (entry["date"]!.GetValue<string>(), entry["checksum"]!.GetValue<string>(), entry["cells"]!.GetValue<int>()));
        await (await server.Visitor.GetAsync("stations/north/days?from=June", null)).ProblemAsync(HttpStatusCode.BadRequest);
    }

    private static byte[] Gzip(string text)
    {
        using var target = new MemoryStream();
        using (var gzip = new GZipStream(target, CompressionLevel.Fastest))
        {
            gzip.Write(Encoding.UTF8.GetBytes(text));
        }

        return target.ToArray();
    }

    private static async Task ReceiptIsAsync(HttpResponseMessage response, HttpStatusCode code, string status, int revision)
    {
        Assert.Equal(code, response.StatusCode);
        var receipt = await response.JsonAsync();
        Assert.Equal((status, revision), (receipt["status"]!.GetValue<string>(), receipt["revision"]!.GetValue<int>()));
        response.Dispose();
    }
}
