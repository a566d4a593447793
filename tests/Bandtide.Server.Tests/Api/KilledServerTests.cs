using System.Globalization;
using System.Net.Http.Json;
using System.Text.Json.Nodes;
using Bandtide.Server.Tests.Hosting;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Api;

/// <summary>A server that is killed in the middle of a bulk upload.</summary>
public sealed class KilledServerTests
{
    private const int Days = 1200;
    private const int Bands = 3;
    private const int CellsOfDay = 24 * Bands;

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task What_was_acknowledged_is_there_and_no_day_is_half_there(StoreKind kind)
    {
        var seed = Random.Shared.Next();
        TestContext.Current.SendDiagnosticMessage("Moments of killing follow from seed {0}.", seed);
        var random = new Random(seed);
        await using var store = await TestStore.StartAsync(kind);
        var body = SampleBodies.Days(Days, Bands);
        var (known, interrupted) = (new Dictionary<string, string>(StringComparer.Ordinal), 0);
        for (var round = 0; round < 4; round++)
        {
            var station = string.Create(CultureInfo.InvariantCulture, $"hut-{round}");
            var acknowledged = await UploadAndKillAsync(store, station, body, random.Next(1, Days * 3 / 4), TimeSpan.FromMilliseconds(random.Next(0, 40)));

            var (code, _, errors) = await ServerProcess.RunAsync(Path.GetTempPath(), ServerProcess.Settings(store.Options), "verify");
            Assert.True(code == 0, $"verify after seed {seed}, round {round}: {errors}");
            var listed = await CheckAsync(store, station, acknowledged, known, body);
            Assert.True(listed >= acknowledged.Count);
            interrupted += listed < Days ? 1 : 0;
        }

        // Were every upload over before the kill, nothing would have been tested.
        Assert.True(interrupted > 0, $"No upload was interrupted (seed {seed}).");
    }

    private static async Task<Dictionary<string, string>> UploadAndKillAsync(TestStore store, string station, string body, int after, TimeSpan later)
    {
        await using var server = await ServerProcess.ListenAsync(store);
        using var client = server.Client();
        using var made = await client.PostAsJsonAsync("stations", new { code = station, name = station, latitude = 50, longitude = 10, levelUnit = "dBm" }, Ct);
        made.EnsureSuccessStatusCode();

        var acknowledged = new Dictionary<string, string>(StringComparer.Ordinal);
        using var connection = await RawConnection.OpenAsync(server.Address);
        var sending = SendAsync(connection, RawConnection.BulkHead(body.Length).Replace("north", station, StringComparison.Ordinal) + body);
        var killing = Task.CompletedTask;
        try
        {
            while (await connection.ReceiptAsync() is { } line)
            {
                if (ParsedOrNull(line) is not { } receipt)
                {
                    break;
                }

                Assert.Equal("created", receipt["status"]!.GetValue<string>());
                acknowledged.Add(receipt["date"]!.GetValue<string>(), receipt["checksum"]!.GetValue<string>());
                if (acknowledged.Count == after)
                {
                    killing = KillLaterAsync(server, later);
                }
            }
        }
        catch (IOException)
        {
            // The connection broke, as it must.
        }

        await killing;
        await sending;
        Assert.True(acknowledged.Count >= after);
        return acknowledged;
    }

    private static async Task<int> CheckAsync(
        TestStore store, string station, Dictionary<string, string> acknowledged, Dictionary<string, string> known, string body)
    {
        await using var server = await ServerProcess.ListenAsync(store);
        using var client = server.Client();
        var listed = (await (await client.GetAsync($"stations/{station}/days", null)).JsonAsync()).AsArray()
            .ToDictionary(day => day!["date"]!.GetValue<string>(), day => day!, StringComparer.Ordinal);
        Assert.All(listed.Values, day => Assert.Equal((CellsOfDay, 1), (day["cells"]!.GetValue<int>(), day["revision"]!.GetValue<int>())));
        Assert.All(acknowledged, day => Assert.Equal(day.Value, listed[day.Key]["checksum"]!.GetValue<string>()));

        var again = await client.PostDaysAsync(station, body);
        Assert.Equal(Days, again.Count);
        Assert.All(again, line => Assert.Equal(
            listed.ContainsKey(line["date"]!.GetValue<string>()) ? "unchanged" : "created", line["status"]!.GetValue<string>()));

        // The same sheets give the same checksums at every station, whole or interrupted.
        foreach (var line in again)
        {
            var (date, checksum) = (line["date"]!.GetValue<string>(), line["checksum"]!.GetValue<string>());
            Assert.Equal(checksum, known.TryAdd(date, checksum) ? checksum : known[date]);
        }

        return listed.Count;
    }

    private static async Task SendAsync(RawConnection connection, string request)
    {
        try
        {
            await connection.SendAsync(request);
        }
        catch (IOException)
        {
            // The server is gone.
        }
    }

    private static async Task KillLaterAsync(ServerProcess server, TimeSpan later)
    {
        await Task.Delay(later, Ct);
        await server.KillAsync();
    }

    // The last line may be cut.
    private static JsonNode? ParsedOrNull(string line)
    {
        try
        {
            return JsonNode.Parse(line);
        }
        catch (System.Text.Json.JsonException)
        {
            return null;
        }
    }
}
