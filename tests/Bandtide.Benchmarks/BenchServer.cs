using System.Diagnostics;
using System.Net;
using System.Net.Http.Headers;
using System.Net.Http.Json;
using System.Text.Json.Nodes;
using Bandtide.Testing.Databases;

namespace Bandtide.Benchmarks;

/// <summary>The built server as a process of its own, over a store of its own.</summary>
internal sealed class BenchServer : IAsyncDisposable
{
    private const string Key = "coordinator-key-of-the-benchmarks-012345";
    private readonly Process process;
    private readonly string folder;

    private BenchServer(Process process, string folder, Uri address)
    {
        (this.process, this.folder, Address) = (process, folder, address);
        Client = new HttpClient(new SocketsHttpHandler { MaxConnectionsPerServer = 16 }) { BaseAddress = new Uri(address, "/api/v1/"), Timeout = TimeSpan.FromMinutes(30) };
        Client.DefaultRequestHeaders.Authorization = new AuthenticationHeaderValue("Bearer", Key);
    }

    public Uri Address { get; }

    public HttpClient Client { get; }

    /// <summary>Folder the server was started in; its embedded store is in <c>data</c>.</summary>
    public string Folder => folder;

    /// <summary>Resident memory, MB.</summary>
    public double MegabytesResident
    {
        get
        {
            process.Refresh();
            return process.WorkingSet64 / 1e6;
        }
    }

    public static async Task<BenchServer> StartAsync(StoreKind kind, string? connectionString = null, params string[] arguments)
    {
        var place = Directory.CreateTempSubdirectory("bandtide-bench-").FullName;
        var configuration = Path.GetFileName(AppContext.BaseDirectory.TrimEnd(Path.DirectorySeparatorChar));
        var program = Path.GetFullPath(Path.Combine(AppContext.BaseDirectory, "..", "..", "Bandtide.Server", configuration, "Bandtide.Server.dll"));
        var start = new ProcessStartInfo("dotnet", [program, "--urls", "http://127.0.0.1:0", .. arguments])
        {
            WorkingDirectory = place,
            RedirectStandardOutput = true,
            UseShellExecute = false,
        };
        start.Environment["Setup__CoordinatorKey"] = Key;
        start.Environment["Storage__Provider"] = kind == StoreKind.Sqlite ? "sqlite" : "postgres";
        start.Environment["ConnectionStrings__Bandtide"] = connectionString;
        var started = Process.Start(start) ?? throw new InvalidOperationException("The server did not start.");
        while (await started.StandardOutput.ReadLineAsync() is { } line)
        {
            if (line.StartsWith("Bandtide is at ", StringComparison.Ordinal))
            {
                _ = Task.Run(started.StandardOutput.ReadToEndAsync);
                return new(started, place, new Uri(line["Bandtide is at ".Length..]));
            }
        }

        throw new InvalidOperationException("The server ended before it was ready.");
    }

    public async Task AddStationAsync(string code)
    {
        using var response = await Client.PostAsJsonAsync("stations", new { code, name = code, latitude = 50, longitude = 10, levelUnit = "dBm" });
        if (response.StatusCode != HttpStatusCode.Created)
        {
            throw new InvalidOperationException(await response.Content.ReadAsStringAsync());
        }
    }

    public async ValueTask DisposeAsync()
    {
        Client.Dispose();
        process.Kill(entireProcessTree: true);
        await process.WaitForExitAsync();
        process.Dispose();
        Directory.Delete(folder, recursive: true);
    }
}
