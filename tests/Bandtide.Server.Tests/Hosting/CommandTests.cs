using System.Diagnostics;
using System.Net;
using System.Net.Sockets;
using Bandtide.Server.Hosting;
using Bandtide.Storage;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using static Bandtide.Server.Tests.Hosting.HttpSteps;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>The command line and the settings, as an operator meets them.</summary>
public sealed class CommandTests
{
    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Migrate_verify_and_rebuild_end_with_0_and_a_damaged_store_with_1(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind, migrated: false);
        Assert.Equal(0, (await RunAsync(store, "migrate")).Code);
        await using (var server = await ServerProcess.ListenAsync(store))
        {
            using var client = server.Client();
            using var made = await client.PostAsync(new Uri("stations", UriKind.Relative), Body("""{"code":"north","name":"N","latitude":1,"longitude":2,"levelUnit":"dBm"}""", "application/json"), Ct);
            Assert.Equal(3, (await client.PostDaysAsync("north", SampleBodies.Days(3))).Count);
            Assert.Equal(0, (await RunAsync(store, "verify")).Code);
        }

        // The tile of one measure in the place of another's.
        await store.SqlAsync("UPDATE month_tile SET tile = (SELECT tile FROM month_tile WHERE measure = 1) WHERE measure = 0");
        var (code, output, errors) = await RunAsync(store, "verify");
        Assert.Equal(1, code);
        Assert.Contains("north", errors, StringComparison.Ordinal);
        Assert.Contains("faults", output, StringComparison.Ordinal);
        Assert.Equal(0, (await RunAsync(store, "rebuild")).Code);
        Assert.Equal(0, (await RunAsync(store, "verify")).Code);
    }

    [Fact]
    public async Task Backup_copies_the_embedded_store_while_the_server_runs()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Sqlite);
        await using var server = await ServerProcess.ListenAsync(store);
        using var client = server.Client();
        using var made = await client.PostAsync(new Uri("stations", UriKind.Relative), Body("""{"code":"north","name":"N","latitude":1,"longitude":2,"levelUnit":"dBm"}""", "application/json"), Ct);
        await client.PostDaysAsync("north", SampleBodies.Days(5));

        using var folder = new TemporaryFolder();
        var (code, _, errors) = await RunAsync(store, "backup", Path.Combine(folder.Path, StoreOptions.FileName));
        Assert.True(code == 0, errors);
        (code, var output, errors) = await ServerProcess.RunAsync(folder.Path, [("Storage__DataDirectory", folder.Path)], "verify");
        Assert.True(code == 0, errors);
        Assert.Contains("1 stations, 5 day sheets", output, StringComparison.Ordinal);
        Assert.Equal(1, (await RunAsync(store, "backup")).Code);
        Assert.Equal(1, (await RunAsync(store, "backup", Path.Combine(folder.Path, StoreOptions.FileName))).Code);
    }

    [Fact]
    public async Task Backup_says_what_to_use_with_PostgreSQL()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Postgres);
        using var folder = new TemporaryFolder();
        var (code, _, errors) = await RunAsync(store, "backup", Path.Combine(folder.Path, "copy.db"));
        Assert.Equal(1, code);
        Assert.Contains("pg_dump", errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("Storage__Provider", "oracle", "Storage:Provider")]
    [InlineData("Storage__Path", "elsewhere", "Storage:Path")]
    [InlineData("Storage__Provider", "postgres", "ConnectionStrings:Bandtide")]
    [InlineData("Setup__CoordinatorKey", "too-short", "Setup:CoordinatorKey")]
    [InlineData("RateLimits__KeyPerSecond", "0", "RateLimits:KeyPerSecond")]
    [InlineData("RateLimits__KeyBurst", "many", "RateLimits:KeyBurst")]
    [InlineData("Uploads__SilenceSeconds", "-1", "Uploads:SilenceSeconds")]
    [InlineData("ASPNETCORE_URLS", "somewhere", "somewhere")]
    public async Task A_wrong_setting_ends_the_start_with_1_and_names_its_key(string name, string value, string told)
    {
        using var folder = new TemporaryFolder();
        var (code, _, errors) = await ServerProcess.RunAsync(folder.Path, [("ASPNETCORE_URLS", "http://127.0.0.1:0"), (name, value)]);
        Assert.Equal(1, code);
        Assert.Contains(told, errors, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", errors, StringComparison.Ordinal);
        Assert.DoesNotContain("too-short", errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_connection_string_that_cannot_be_read_is_not_repeated()
    {
        using var folder = new TemporaryFolder();
        var (code, _, errors) = await ServerProcess.RunAsync(folder.Path, [("Storage__Provider", "postgres"), ("ConnectionStrings__Bandtide", "Hots=db;Password=secret-word")], "migrate");
        Assert.Equal(1, code);
        Assert.Contains("ConnectionStrings:Bandtide", errors, StringComparison.Ordinal);
        Assert.DoesNotContain("secret-word", errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_store_out_of_reach_ends_the_start_with_a_sentence()
    {
        using var folder = new TemporaryFolder();
        var (code, _, errors) = await ServerProcess.RunAsync(folder.Path, [("Storage__Provider", "postgres"), ("ConnectionStrings__Bandtide", "Host=127.0.0.1;Port=1;Username=nobody;Database=none")], "verify");
        Assert.Equal(1, code);
        Assert.Contains("store", errors, StringComparison.Ordinal);
        Assert.DoesNotContain("   at ", errors, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_taken_port_ends_the_start_with_a_sentence()
    {
        using var taken = new TcpListener(IPAddress.Loopback, 0);
        taken.Start();
        using var folder = new TemporaryFolder();
        var (code, _, errors) = await ServerProcess.RunAsync(folder.Path, [], "--urls", $"http://127.0.0.1:{((IPEndPoint)taken.LocalEndpoint).Port}");
        Assert.Equal(1, code);
        Assert.Contains("already in use", errors, StringComparison.Ordinal);
    }

    // --demo has no value: what follows it is read all the same.
    [Fact]
    public void Demo_takes_nothing_from_the_rest_of_the_command_line()
    {
        var arguments = ServerArguments.Parse(["--demo", "--urls", "http://127.0.0.1:1"]);
        Assert.True(arguments.IsDemo);
        Assert.Equal(["--urls", "http://127.0.0.1:1"], arguments.Settings);
        Assert.Empty(arguments.Command);
        Assert.Equal(["backup", "a.db"], ServerArguments.Parse(["backup", "a.db", "--Storage:DataDirectory", "x"]).Command);
        Assert.False(ServerArguments.Parse(["verify"]).IsDemo);
    }

    // The data folder stands where the command was typed, not in the project's folder.
    [Fact]
    public async Task The_run_command_makes_its_data_folder_where_it_was_typed()
    {
        var configuration = AppContext.BaseDirectory.Contains("release", StringComparison.OrdinalIgnoreCase) ? "Release" : "Debug";
        using var folder = new TemporaryFolder();
        var project = Path.Combine(Repository.Root, "src", "Bandtide.Server");
        using var run = Process.Start(new ProcessStartInfo("dotnet", ["run", "--no-build", "-c", configuration, "--project", project, "--", "migrate"])
        {
            WorkingDirectory = folder.Path,
            RedirectStandardOutput = true,
            UseShellExecute = false,
        })!;
        var output = await run.StandardOutput.ReadToEndAsync(Ct);
        await run.WaitForExitAsync(Ct);
        Assert.True(run.ExitCode == 0, output);
        Assert.True(File.Exists(Path.Combine(folder.Path, "data", StoreOptions.FileName)));
        Assert.False(Directory.Exists(Path.Combine(project, "data")));
    }

    private static Task<(int Code, string Output, string Errors)> RunAsync(TestStore store, params string[] command) =>
        ServerProcess.RunAsync(Path.GetTempPath(), ServerProcess.Settings(store.Options), command);
}
