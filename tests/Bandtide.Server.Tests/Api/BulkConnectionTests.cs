using System.Globalization;
using System.Net;
using System.Text;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using CsCheck;
using static Bandtide.Server.Tests.Hosting.HttpSteps;
using static Bandtide.Server.Tests.Hosting.RawConnection;

namespace Bandtide.Server.Tests.Api;

/// <summary>Bulk uploads over connections that break, dawdle or end early.</summary>
public sealed class BulkConnectionTests
{
    private const string Header = "date,hour,band,sweeps,occupancy\n";
    private static readonly TimeSpan Soon = TimeSpan.FromSeconds(20);

    [Fact]
    public async Task A_receipt_comes_while_the_body_is_still_being_sent()
    {
        await using var server = await StartAsync();
        using var connection = await OpenAsync(server.Address);
        await connection.SendAsync(BulkHead(null));
        await connection.SendAsync(Chunk(Encoding.ASCII.GetBytes(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,0\n2026-01-02,1,bc-")));
        var receipt = JsonNode.Parse((await connection.ReceiptAsync().WaitAsync(Soon, Ct))!)!;
        Assert.Equal("2026-01-01 created", $"{receipt["date"]} {receipt["status"]}");

        await connection.SendAsync(Chunk("49m,1,0\n"u8.ToArray()));
        await connection.SendAsync("0\r\n\r\n");
        var rest = await connection.RestAsync().WaitAsync(Soon, Ct);
        Assert.Contains("\"date\":\"2026-01-02\",\"status\":\"created\"", rest, StringComparison.Ordinal);
        Assert.EndsWith("0\r\n\r\n", rest, StringComparison.Ordinal);
    }

    // A body cut at any byte, its connection reset or closed, with a length or in chunks: whole days stay, in the order of
    // the body, never the day that was cut.
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_body_cut_at_any_byte_leaves_whole_days_only(StoreKind kind)
    {
        await using var server = await StartAsync(kind);
        var bytes = Encoding.ASCII.GetBytes(SampleBodies.Days(30));
        var ends = EndsOfDays(bytes);
        await Gen.Select(Gen.Int[1, bytes.Length - 1], Gen.Bool, Gen.Bool, Gen.Bool).SampleAsync(
            async (cut, chunked, reset, ndjsonLater) =>
            {
                var station = await NewStationAsync(server);
                using (var connection = await OpenAsync(server.Address))
                {
                    await connection.SendAsync(BulkHead(chunked ? null : bytes.Length).Replace("north", station, StringComparison.Ordinal));
                    await connection.SendAsync(chunked ? Chunk(bytes[..cut]) : bytes.AsMemory(0, cut));
                    if (ndjsonLater)
                    {
                        await Task.Delay(20, Ct);
                    }

                    if (reset)
                    {
                        connection.Reset();
                    }
                }

                var whole = ends.Count(end => end < cut);
                var listed = await ListedAfterQuietAsync(server, station);
                Assert.True(listed.Count <= whole, $"{listed.Count} days from {whole} whole ones");
                Assert.Equal(Enumerable.Range(0, listed.Count).Select(SampleBodies.Date), listed.Select(day => day!["date"]!.GetValue<string>()));
                Assert.All(listed, day => Assert.Equal(48, day!["cells"]!.GetValue<int>()));
                return true;
            },
            iter: 40, threads: 1);
        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    [Fact]
    public async Task Days_that_were_acknowledged_before_the_cut_are_stored()
    {
        await using var server = await StartAsync();
        var bytes = Encoding.ASCII.GetBytes(SampleBodies.Days(800));
        var acknowledged = new List<string>();
        using (var connection = await OpenAsync(server.Address))
        {
            await connection.SendAsync(BulkHead(bytes.Length));
            await connection.SendAsync(bytes.AsMemory(0, bytes.Length * 3 / 4));
            while (acknowledged.Count < 366 && await connection.ReceiptAsync().WaitAsync(Soon, Ct) is { } line)
            {
                acknowledged.Add(JsonNode.Parse(line)!["date"]!.GetValue<string>());
            }

            connection.Reset();
        }

        Assert.Equal(366, acknowledged.Count);
        var listed = (await ListedAfterQuietAsync(server, "north")).Select(day => day!["date"]!.GetValue<string>()).ToHashSet(StringComparer.Ordinal);
        Assert.Superset(acknowledged.ToHashSet(StringComparer.Ordinal), listed);
    }

    [Theory]
    [InlineData("cut", "2026-01-01 created,2026-01-02 refused body-incomplete")]
    [InlineData("without its trailer", "2026-01-01 created,2026-01-02 refused body-incomplete")]
    [InlineData("whole", "2026-01-01 created,2026-01-02 created")]
    [InlineData("in two members", "2026-01-01 created,2026-01-02 created")]
    public async Task A_compressed_body_counts_as_ended_only_with_its_trailer(string state, string expected)
    {
        const string days = Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,0\n";
        var whole = SampleBodies.Gzip(days);
        byte[] body = state switch
        {
            "cut" => SampleBodies.Gzip(days + "2026-01-02,1,bc-49m,1,0." + new string('1', 60_000) + "\n")[..90],
            "without its trailer" => whole[..^8],
            "whole" => whole,
            _ => [.. SampleBodies.Gzip(days[..50]), .. SampleBodies.Gzip(days[50..])],
        };
        await using var server = await StartAsync();
        using var content = new ByteArrayContent(body);
        content.Headers.ContentType = new("text/csv");
        content.Headers.ContentEncoding.Add("gzip");
        using var response = await server.Coordinator.PostAsync(new Uri("stations/north/days", UriKind.Relative), content, Ct);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        var lines = Lines(await response.Content.ReadAsStringAsync(Ct));
        Assert.Equal(expected, string.Join(",", lines.Select(line => $"{line["date"]} {line["status"]} {line["errors"]?[0]!["rule"]}".TrimEnd())));
    }

    [Fact]
    public async Task A_compressed_body_with_a_wrong_checksum_is_refused_or_loses_its_last_day()
    {
        await using var server = await StartAsync();
        foreach (var days in new[] { 2, 300 })
        {
            var body = SampleBodies.Gzip(SampleBodies.Days(days));
            body[^6] ^= 1;
            using var content = new ByteArrayContent(body);
            content.Headers.ContentType = new("text/csv");
            content.Headers.ContentEncoding.Add("gzip");
            using var response = await server.Coordinator.PostAsync(new Uri("stations/north/days", UriKind.Relative), content, Ct);
            var text = await response.Content.ReadAsStringAsync(Ct);
            Assert.Contains("body-incomplete", text, StringComparison.Ordinal);
            Assert.DoesNotContain($"\"date\":\"{SampleBodies.Date(days - 1)}\",\"status\":\"created\"", text, StringComparison.Ordinal);
        }

        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    [Fact]
    public async Task A_client_that_asks_first_is_told_to_go_on_or_why_not()
    {
        await using var server = await StartAsync();
        var body = SampleBodies.Days(2);
        using (var connection = await OpenAsync(server.Address))
        {
            await connection.SendAsync(BulkHead(body.Length, "Expect: 100-continue\r\n"));
            Assert.Equal("HTTP/1.1 100 Continue", await connection.LineAsync().AsTask().WaitAsync(Soon, Ct));
            await connection.SendAsync(body);
            Assert.Equal(2, (await connection.RestAsync().WaitAsync(Soon, Ct)).Split("\"created\"").Length - 1);
        }

        using var refused = await OpenAsync(server.Address);
        await refused.SendAsync(BulkHead(body.Length, "Expect: 100-continue\r\n", type: "text/plain"));
        Assert.StartsWith("HTTP/1.1 415", await refused.LineAsync().AsTask().WaitAsync(Soon, Ct), StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_sender_that_falls_silent_is_answered_and_cut_off()
    {
        await using var server = await StartAsync(StoreKind.Sqlite, ("Uploads:SilenceSeconds", "1"));
        using var connection = await OpenAsync(server.Address);
        await connection.SendAsync(BulkHead(1_000_000));
        await connection.SendAsync(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,0\n");
        Assert.Contains("\"date\":\"2026-01-01\",\"status\":\"created\"", await connection.ReceiptAsync().WaitAsync(Soon, Ct), StringComparison.Ordinal);
        var last = await connection.ReceiptAsync().WaitAsync(Soon, Ct);
        Assert.Contains("\"date\":\"2026-01-02\",\"status\":\"refused\"", last, StringComparison.Ordinal);
        Assert.Contains("body-incomplete", last, StringComparison.Ordinal);

        // The answer does not end as a whole one would.
        var ending = await Record.ExceptionAsync(async () => Assert.DoesNotContain("0\r\n\r\n", await connection.RestAsync().WaitAsync(Soon, Ct), StringComparison.Ordinal));
        Assert.True(ending is null or IOException, ending?.ToString());
    }

    [Fact]
    public async Task A_slow_sender_that_is_never_silent_for_long_is_heard_to_the_end()
    {
        await using var server = await StartAsync(StoreKind.Sqlite, ("Uploads:SilenceSeconds", "5"));
        var body = Encoding.ASCII.GetBytes(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,0\n");
        using var connection = await OpenAsync(server.Address);
        await connection.SendAsync(BulkHead(body.Length));
        foreach (var part in body.Chunk(body.Length / 7))
        {
            await connection.SendAsync(part);
            await Task.Delay(900, Ct);
        }

        Assert.Equal(2, (await connection.RestAsync().WaitAsync(Soon, Ct)).Split("\"created\"").Length - 1);
    }

    // 60 MB, more than the server's ordinary limit, sent whole before a byte of the refusal is read.
    [Theory]
    [InlineData("POST", "stations/north/days", "text/plain", true, 415)]
    [InlineData("POST", "stations/nowhere/days", "text/csv", true, 404)]
    [InlineData("POST", "stations/north/days", "text/csv", true, 400)]
    [InlineData("POST", "stations/north/days", "text/csv", false, 401)]
    [InlineData("PUT", "stations/north/days/2026-01-01", "text/csv", true, 413)]
    public async Task A_refusal_reaches_a_client_that_sends_all_before_it_reads(string method, string path, string type, bool goodKey, int status)
    {
        await using var server = await StartAsync();
        using var connection = await OpenAsync(server.Address);
        var body = new byte[60_000_000];
        Array.Fill(body, (byte)'x');
        var head = Head(method, $"/api/v1/{path}", body.Length, $"Content-Type: {type}\r\n");
        await connection.SendAsync(goodKey ? head : head.Replace(ServerHost.CoordinatorKey, "wrong", StringComparison.Ordinal));
        await connection.SendAsync(body);
        var answer = await connection.RestAsync().WaitAsync(Soon, Ct);
        Assert.StartsWith(string.Create(CultureInfo.InvariantCulture, $"HTTP/1.1 {status} "), answer, StringComparison.Ordinal);
        Assert.Contains("application/problem+json", answer, StringComparison.Ordinal);
    }

    private static async Task<ServerHost> StartAsync(StoreKind kind = StoreKind.Sqlite, params (string Key, string Value)[] settings)
    {
        var server = await ServerHost.StartAsync(kind, settings: settings);
        await server.AddStationAsync("north");
        return server;
    }

    private static int stations;

    private static async Task<string> NewStationAsync(ServerHost server)
    {
        var code = string.Create(CultureInfo.InvariantCulture, $"cut-{Interlocked.Increment(ref stations)}");
        await server.AddStationAsync(code);
        return code;
    }

    private static List<int> EndsOfDays(byte[] body)
    {
        var ends = new List<int>();
        var text = Encoding.ASCII.GetString(body);
        for (var day = 1; text.IndexOf('\n' + SampleBodies.Date(day), StringComparison.Ordinal) is var place and >= 0; day++)
        {
            ends.Add(place + 1);
        }

        return ends;
    }

    // A commit may be under way when the connection breaks: asks until two answers in a row are the same.
    private static async Task<JsonArray> ListedAfterQuietAsync(ServerHost server, string station)
    {
        var last = -1;
        while (true)
        {
            var listed = (await (await server.Visitor.GetAsync($"stations/{station}/days", null)).JsonAsync()).AsArray();
            if (listed.Count == last)
            {
                return listed;
            }

            last = listed.Count;
            await Task.Delay(100, Ct);
        }
    }
}
