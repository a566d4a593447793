using System.Diagnostics;
using System.Net.Http.Headers;
using System.Text;
using System.Threading.Channels;
using Bandtide.Storage;
using Bandtide.Testing.Databases;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>The built program as a process of its own, in a folder of its own: what an operator starts, and what a test may kill.</summary>
public sealed class ServerProcess : IAsyncDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);

    private readonly Process process;
    private readonly Channel<string> lines = Channel.CreateUnbounded<string>();
    private readonly StringBuilder errors = new();

    private ServerProcess(Process process)
    {
        this.process = process;
        process.OutputDataReceived += (_, e) =>
        {
            if (e.Data is { } line)
            {
                lines.Writer.TryWrite(line);
            }
            else
            {
                lines.Writer.TryComplete();
            }
        };
        process.ErrorDataReceived += (_, e) =>
        {
            lock (errors)
            {
                errors.AppendLine(e.Data);
            }
        };
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
    }

    /// <summary>Where it listens, once it has said so.</summary>
    public Uri Address { get; private set; } = new("http://127.0.0.1");

    /// <summary>What it has written to standard error so far.</summary>
    public string Errors
    {
        get
        {
            lock (errors)
            {
                return errors.ToString();
            }
        }
    }

    /// <summary>Settings that point the program at a store.</summary>
    public static (string Key, string Value)[] Settings(StoreOptions store) =>
    [
        ("Storage__Provider", store.Provider),
        ("Storage__DataDirectory", store.Provider is StoreProvider.Sqlite ? store.DataDirectory : Path.GetTempPath()),
        ("ConnectionStrings__Bandtide", store.ConnectionString ?? ""),
    ];

    /// <summary>Starts the program.</summary>
    /// <param name="folder">The folder where the command is typed.</param>
    /// <param name="settings">Environment.</param>
    /// <param name="arguments">What stands behind its name.</param>
    public static ServerProcess Start(string folder, IEnumerable<(string Key, string Value)> settings, params string[] arguments)
    {
        var start = new ProcessStartInfo("dotnet", [Path.Combine(AppContext.BaseDirectory, "Bandtide.Server.dll"), .. arguments])
        {
            WorkingDirectory = folder,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        foreach (var name in start.Environment.Keys.Where(IsOurs).ToList())
        {
            start.Environment.Remove(name);
        }

        foreach (var (key, value) in settings)
        {
            start.Environment[key] = value;
        }

        return new(Process.Start(start) ?? throw new InvalidOperationException("The program did not start."));
    }

    /// <summary>Starts the program as a server on a free port and waits until it listens.</summary>
    public static async Task<ServerProcess> ListenAsync(string folder, IEnumerable<(string Key, string Value)> settings, params string[] arguments)
    {
        var server = Start(folder, settings, ["--urls", "http://127.0.0.1:0", .. arguments]);
        var said = await server.LineAsync(line => line.StartsWith("Bandtide is at ", StringComparison.Ordinal));
        server.Address = new(said["Bandtide is at ".Length..]);
        return server;
    }

    /// <summary>Starts the program as a server over a store, with the tests' coordinator key.</summary>
    public static Task<ServerProcess> ListenAsync(TestStore store, params string[] arguments) =>
        ListenAsync(Path.GetTempPath(), [.. Settings(store.Options), ("Setup__CoordinatorKey", ServerHost.CoordinatorKey)], arguments);

    /// <summary>Runs the program to its end.</summary>
    public static async Task<(int Code, string Output, string Errors)> RunAsync(
        string folder, IEnumerable<(string Key, string Value)> settings, params string[] arguments)
    {
        await using var program = Start(folder, settings, arguments);
        var output = await program.RestAsync();
        return (await program.EndAsync(), output, program.Errors);
    }

    /// <summary>The next line of standard output that is meant.</summary>
    public async Task<string> LineAsync(Func<string, bool> isMeant)
    {
        using var patience = new CancellationTokenSource(Patience);
        try
        {
            await foreach (var line in lines.Reader.ReadAllAsync(patience.Token))
            {
                if (isMeant(line))
                {
                    return line;
                }
            }
        }
        catch (OperationCanceledException)
        {
            // Told below.
        }

        throw new InvalidOperationException($"The program has not said what was waited for. {Errors}");
    }

    /// <summary>Everything it says from now on until it ends.</summary>
    public async Task<string> RestAsync()
    {
        var rest = new StringBuilder();
        await foreach (var line in lines.Reader.ReadAllAsync(HttpSteps.Ct))
        {
            rest.AppendLine(line);
        }

        return rest.ToString();
    }

    /// <summary>A client with a key, or none.</summary>
    public HttpClient Client(string? key = ServerHost.CoordinatorKey)
    {
        var client = new HttpClient { BaseAddress = new(Address, "/api/v1/") };
        client.DefaultRequestHeaders.Authorization = key is null ? null : new AuthenticationHeaderValue("Bearer", key);
        return client;
    }

    /// <summary>Ends it at once, as <c>kill -9</c> does: no handler of its own runs.</summary>
    public async Task KillAsync()
    {
        process.Kill();
        await process.WaitForExitAsync();
    }

    /// <summary>Asks it to end, as a service manager does, and waits for its exit code.</summary>
    public async Task<int> StopAsync()
    {
        using var kill = Process.Start("kill", ["-TERM", process.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]);
        return await EndAsync();
    }

    public async ValueTask DisposeAsync()
    {
        if (!process.HasExited)
        {
            await KillAsync();
        }

        process.Dispose();
    }

    private async Task<int> EndAsync()
    {
        using var patience = new CancellationTokenSource(Patience);
        await process.WaitForExitAsync(patience.Token);
        return process.ExitCode;
    }

    // A developer's own settings must not leak into what a test starts.
    private static bool IsOurs(string name) =>
        name.StartsWith("ASPNETCORE_", StringComparison.Ordinal) || name.StartsWith("DOTNET_ENVIRONMENT", StringComparison.Ordinal)
        || new[] { "Storage__", "Setup__", "RateLimits__", "Uploads__", "ConnectionStrings__", "Kestrel__", "Logging__" }
            .Any(section => name.StartsWith(section, StringComparison.OrdinalIgnoreCase));
}
