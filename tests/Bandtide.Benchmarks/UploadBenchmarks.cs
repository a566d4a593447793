using System.Diagnostics;
using System.Net.Http.Headers;
using System.Text;
using Bandtide.Core.Time;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;

namespace Bandtide.Benchmarks;

/// <summary>Uploads: one by one, many in one body, and from memory into the store. Everything durable.</summary>
internal static class UploadBenchmarks
{
    public static async Task PutAsync(StoreKind kind, string? connectionString)
    {
        await using var server = await BenchServer.StartAsync(kind, connectionString);
        const int clients = 8;
        const int each = 100;
        for (var c = 0; c < clients; c++)
        {
            await server.AddStationAsync($"put-{c}");
        }

        var bodies = Enumerable.Range(0, each).Select(day => ReferenceLoad.Csv(ReferenceLoad.Sheet(day), null)).ToArray();
        var next = 0;
        await Bench.MedianAsync($"one day by PUT, {kind}", each - 1, () => PutAsync(server, "put-0", next, bodies[next++]));
        var started = Stopwatch.GetTimestamp();
        await Task.WhenAll(Enumerable.Range(1, clients - 1).Select(async c =>
        {
            for (var day = 0; day < each; day++)
            {
                await PutAsync(server, $"put-{c}", day, bodies[day]);
            }
        }));
        Bench.Say($"| days by PUT, {clients - 1} clients at once, {kind} | {(clients - 1) * each / Stopwatch.GetElapsedTime(started).TotalSeconds:0}/s | {(clients - 1) * each} days |");
    }

    public static async Task BulkAsync(StoreKind kind, string? connectionString)
    {
        await using var server = await BenchServer.StartAsync(kind, connectionString);
        const int days = 1460;
        var body = new MemoryStream();
        body.Write(Encoding.ASCII.GetBytes("date,hour,band,sweeps,occupancy,signal,level,level_p90,floor,steady,coverage\n"));
        for (var day = 0; day < days; day++)
        {
            body.Write(ReferenceLoad.Csv(ReferenceLoad.Sheet(day), ReferenceLoad.FirstDate.AddDays(day)));
        }

        var idle = server.MegabytesResident;
        var peak = idle;
        foreach (var station in new[] { "warm-up", "bulk-a", "bulk-b", "bulk-c" })
        {
            await server.AddStationAsync(station);
            using var content = new ByteArrayContent(body.GetBuffer(), 0, (int)body.Length);
            content.Headers.ContentType = new MediaTypeHeaderValue("text/csv");
            var started = Stopwatch.GetTimestamp();
            using var response = await server.Client.PostAsync(new Uri($"stations/{station}/days", UriKind.Relative), content);
            var lines = (await response.Content.ReadAsStringAsync()).Split('\n', StringSplitOptions.RemoveEmptyEntries);
            var seconds = Stopwatch.GetElapsedTime(started).TotalSeconds;
            if (lines.Count(line => line.Contains("\"created\"", StringComparison.Ordinal)) != days)
            {
                throw new InvalidOperationException($"Not all days were created: {lines.FirstOrDefault()}");
            }

            peak = Math.Max(peak, server.MegabytesResident);
            Bench.Say($"| bulk CSV over HTTP, {station}, {kind} | {days / seconds:0} station-days/s | {body.Length / 1e6:0} MB in {seconds:0.00} s |");
        }

        Bench.Say($"| server memory, {kind} | idle {idle:0} MB | {peak:0} MB after bulk uploads |");
    }

    public static async Task StoreAsync(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var made = (StationCreation.Created)await store.Network.CreateStationAsync(
            new("station", "station", new(50, 10), Core.Stations.LevelUnit.DbMilliwatt, []), CancellationToken.None);
        for (var year = 0; year < 4; year++)
        {
            var days = ReferenceLoad.Days(0, year * 366, 366);
            var started = Stopwatch.GetTimestamp();
            await store.Days.StoreAsync(made.Station, days, restoreWithdrawn: false, CancellationToken.None);
            Bench.Say($"| bulk from memory into the store, {kind} | {days.Length / Stopwatch.GetElapsedTime(started).TotalSeconds:0} station-days/s | {days.Length} days |");
        }
    }

    private static async Task PutAsync(BenchServer server, string station, int day, byte[] body)
    {
        using var content = new ByteArrayContent(body);
        content.Headers.ContentType = new MediaTypeHeaderValue("text/csv");
        using var response = await server.Client.PutAsync(
            new Uri($"stations/{station}/days/{DateText.Format(ReferenceLoad.FirstDate.AddDays(day))}", UriKind.Relative), content);
        response.EnsureSuccessStatusCode();
    }
}
