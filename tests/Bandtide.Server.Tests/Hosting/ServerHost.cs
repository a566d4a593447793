using System.Net;
using System.Net.Http.Headers;
using System.Net.Http.Json;
using System.Text.Json.Nodes;
using Bandtide.Storage;
using Bandtide.Testing;
using Bandtide.Testing.Databases;
using Microsoft.AspNetCore.Hosting;
using Microsoft.AspNetCore.Mvc.Testing;
using Microsoft.Extensions.DependencyInjection;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>The real server on a real port of the loopback, over a store of its own.</summary>
public sealed class ServerHost : IAsyncDisposable
{
    public const string CoordinatorKey = "coordinator-key-of-the-tests-0123456789";

    private readonly WebApplicationFactory<Program> factory;
    private readonly TestStore store;

    private ServerHost(TestStore store, WebApplicationFactory<Program> factory)
    {
        (this.store, this.factory) = (store, factory);
        Address = factory.ClientOptions.BaseAddress;
        Coordinator = Client(CoordinatorKey);
        Visitor = Client(null);
    }

    public Uri Address { get; }

    /// <summary>A client with the coordinator's key.</summary>
    public HttpClient Coordinator { get; }

    /// <summary>A client without a key.</summary>
    public HttpClient Visitor { get; }

    /// <summary>The server's own services.</summary>
    public IServiceProvider Services => factory.Services;

    /// <summary>The store behind the server, opened a second time.</summary>
    public TestStore Store => store;

    /// <summary>Starts the server.</summary>
    /// <param name="kind">Its database.</param>
    /// <param name="clock">Its clock; noon of 2026-07-01 when left out, so that no date of a test lies in the future anywhere.</param>
    /// <param name="settings">Further settings.</param>
    public static async Task<ServerHost> StartAsync(StoreKind kind, TimeProvider? clock = null, params (string Key, string Value)[] settings)
    {
        clock ??= new SettableClock(new(2026, 7, 1, 12, 0, 0, TimeSpan.Zero));
        var behind = await TestStore.StartAsync(kind, clock, migrated: false);
        var server = new WebApplicationFactory<Program>().WithWebHostBuilder(builder =>
        {
            builder.UseSetting("Storage:Provider", behind.Options.Provider);
            builder.UseSetting("Storage:DataDirectory", kind == StoreKind.Sqlite ? behind.Options.DataDirectory : Path.GetTempPath());
            builder.UseSetting("ConnectionStrings:Bandtide", behind.Options.ConnectionString);
            builder.UseSetting("Setup:CoordinatorKey", CoordinatorKey);
            foreach (var (key, value) in settings)
            {
                builder.UseSetting(key, value);
            }

            builder.ConfigureServices(services => services.AddSingleton(clock));
        });
        server.UseKestrel(kestrel => kestrel.Listen(IPAddress.Loopback, 0));
        server.StartServer();
        return new(behind, server);
    }

    /// <summary>A client with any key.</summary>
    public HttpClient Client(string? key)
    {
        var client = new HttpClient { BaseAddress = new(Address, "/api/v1/") };
        if (key is not null)
        {
            client.DefaultRequestHeaders.Authorization = new AuthenticationHeaderValue("Bearer", key);
        }

        return client;
    }

    /// <summary>Registers a station and returns its key.</summary>
    public async Task<string> AddStationAsync(string code, double latitude = 52.5, double longitude = 13.4, string unit = "dBm")
    {
        using var response = await Coordinator.PostAsJsonAsync("stations", new { code, name = $"Station {code}", latitude, longitude, levelUnit = unit });
        Assert.Equal(HttpStatusCode.Created, response.StatusCode);
        return (await response.JsonAsync())["key"]!.GetValue<string>();
    }

    public async ValueTask DisposeAsync()
    {
        Coordinator.Dispose();
        Visitor.Dispose();
        await factory.DisposeAsync();
        await store.DisposeAsync();
    }
}
