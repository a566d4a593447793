using System.Globalization;
using System.Net;
using System.Net.Sockets;
using System.Text;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>Many days in one body.</summary>
public sealed class BulkTests
{
    private const string Header = "date,hour,band,sweeps,occupancy\n";

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Days_are_answered_line_by_line_in_the_order_of_the_body(StoreKind kind)
    {
        await using var server = await ServerHost.StartAsync(kind);
        await server.AddStationAsync("north");
        var body = Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,7\nsoon,0,bc-49m,1,0\n2026-01-03,0,bc-49m,1,0.25\n2026-01-01,1,bc-49m,1,0\n";
        var lines = await server.Coordinator.PostDaysAsync("north", body);
        Assert.Equal("2026-01-01 created,2026-01-02 refused,soon refused,2026-01-03 created,2026-01-01 refused", Short(lines));
        Assert.Equal((3, "occupancy", "share-range"), Error(lines[1]));
        Assert.Equal((4, "date", "date-syntax"), Error(lines[2]));
        Assert.Equal((6, "date", "date-again"), Error(lines[4]));

        await server.Coordinator.DeleteAsync(new Uri("stations/north/days/2026-01-03", UriKind.Relative), Ct);
        var good = Header + "2026-01-01,0,bc-49m,1,0\n2026-01-03,0,bc-49m,1,0.25\n";
        Assert.Equal("2026-01-01 unchanged,2026-01-03 withdrawn", Short(await server.Coordinator.PostDaysAsync("north", good)));
        Assert.Equal("2026-01-01 unchanged,2026-01-03 created", Short(await server.Coordinator.PostDaysAsync("north", good, query: "?restore=true")));
        var json = "{\"date\":\"2026-01-04\",\"cells\":[{\"hour\":3,\"band\":\"bc-31m\",\"sweeps\":5,\"occupancy\":0.5}]}\nnonsense\n";
        Assert.Equal("2026-01-04 created,nonsense refused", Short(await server.Coordinator.PostDaysAsync("north", json, "application/x-ndjson")));
        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
    }

    [Fact]
    public async Task A_bad_header_refuses_the_whole_body()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        using var response = await server.Coordinator.PostAsync(new Uri("stations/north/days", UriKind.Relative), Body("hour,band,sweeps,occupancy\n0,bc-49m,1,0\n"), Ct);
        Assert.Equal((1, "date", "column-missing"), Assert.Single(await response.ProblemAsync(HttpStatusCode.BadRequest)));
    }

    // Sends 4,000 refused days with many errors each before it reads a byte of the answer, as ordinary clients do.
    [Fact]
    public async Task A_client_may_send_all_and_then_read()
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var body = new StringBuilder(Header);
        for (var day = 0; day < 4000; day++)
        {
            var date = new DateOnly(2010, 1, 1).AddDays(day).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
            for (var hour = 0; hour < 40; hour++)
            {
                body.Append(CultureInfo.InvariantCulture, $"{date},{30 + hour},bc-49m,1,0\n");
            }
        }

        var lines = await SendAllThenReadAsync(server.Address, body.ToString());
        Assert.Equal(4000, lines.Count);
        Assert.All(lines, line => Assert.Equal(40, line["errors"]!.AsArray().Count));
    }

    [Theory]
    [InlineData(0.2)]
    [InlineData(0.5)]
    [InlineData(0.9)]
    public async Task A_broken_connection_leaves_whole_days_and_never_the_last(double share)
    {
        await using var server = await ServerHost.StartAsync(StoreKind.Sqlite);
        await server.AddStationAsync("north");
        var body = await File.ReadAllTextAsync(MeasuredData.Tokyo, Ct);
        var acknowledged = new List<string>();
        using (var client = new TcpClient())
        {
            await client.ConnectAsync(IPAddress.Loopback, server.Address.Port, Ct);
            var bytes = Encoding.ASCII.GetBytes(Head(body.Length) + body);
            await client.GetStream().WriteAsync(bytes.AsMemory(0, (int)(bytes.Length * share)), Ct);
            using var reader = new StreamReader(client.GetStream());
            while (acknowledged.Count < (int)(10 * share) - 1 && await reader.ReadLineAsync(Ct) is { } line)
            {
                if (line.StartsWith('{'))
                {
                    acknowledged.Add(JsonNode.Parse(line)!["date"]!.GetValue<string>());
                }
            }
        }

        await Task.Delay(300, Ct);
        using var station = server.Client(ServerHost.CoordinatorKey);
        var listed = (await (await station.GetAsync("stations/north/days", null)).JsonAsync()).AsArray();
        Assert.Superset(acknowledged.ToHashSet(StringComparer.Ordinal), listed.Select(day => day!["date"]!.GetValue<string>()).ToHashSet(StringComparer.Ordinal));
        Assert.InRange(listed.Count, (int)(10 * share) - 1, 9);
        Assert.All(listed, day => Assert.Equal(24, day!["cells"]!.GetValue<int>()));
        Assert.Empty((await server.Store.Maintenance.VerifyAsync(Ct)).Faults);
        var again = await station.PostDaysAsync("north", body);
        Assert.Equal(listed.Count, again.Count(line => line["status"]!.GetValue<string>() is "unchanged"));
        Assert.Equal(10 - listed.Count, again.Count(line => line["status"]!.GetValue<string>() is "created"));
    }

    private static string Head(int length) =>
        $"POST /api/v1/stations/north/days HTTP/1.1\r\nHost: localhost\r\nAuthorization: Bearer {ServerHost.CoordinatorKey}\r\nContent-Type: text/csv\r\nContent-Length: {length.ToString(CultureInfo.InvariantCulture)}\r\nConnection: close\r\n\r\n";

    private static async Task<IReadOnlyList<JsonNode>> SendAllThenReadAsync(Uri server, string body)
    {
        using var client = new TcpClient();
        await client.ConnectAsync(IPAddress.Loopback, server.Port, Ct);
        var stream = client.GetStream();
        await stream.WriteAsync(Encoding.ASCII.GetBytes(Head(body.Length) + body), Ct);
        using var reader = new StreamReader(stream);
        var answer = await reader.ReadToEndAsync(Ct);
        Assert.StartsWith("HTTP/1.1 200", answer, StringComparison.Ordinal);
        return [.. answer.Split('\n').Where(line => line.StartsWith('{')).Select(line => JsonNode.Parse(line)!)];
    }

    private static string Short(IReadOnlyList<JsonNode> lines) => string.Join(",", lines.Select(line => $"{line["date"]} {line["status"]}"));

    private static (int Line, string Field, string Rule) Error(JsonNode line)
    {
        var error = Assert.Single(line["errors"]!.AsArray())!;
        return (error["line"]!.GetValue<int>(), error["field"]!.GetValue<string>(), error["rule"]!.GetValue<string>());
    }
}
