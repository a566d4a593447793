using Microsoft.AspNetCore.DataProtection;

namespace Bandtide.Server.Hosting;

/// <summary>What the host needs beside API and pages.</summary>
internal static class HostingSetup
{
    private const string DefaultUrl = "http://127.0.0.1:5210";

    public static void UseDefaultUrl(this IWebHostBuilder host, IConfiguration configuration)
    {
        if (string.IsNullOrEmpty(configuration["urls"]) && string.IsNullOrEmpty(configuration["http_ports"])
            && !configuration.GetSection("Kestrel:Endpoints").Exists())
        {
            host.UseUrls(DefaultUrl);
        }
    }

    public static void AddHosting(this IServiceCollection services, string dataDirectory)
    {
        // Cookies and form tokens stay good over a restart; nothing is written outside the data directory.
        services.AddDataProtection().SetApplicationName("Bandtide").PersistKeysToFileSystem(new(Path.Combine(dataDirectory, "keys")));
        services.Configure<Microsoft.AspNetCore.Server.Kestrel.Core.KestrelServerOptions>(options => options.AddServerHeader = false);
        services.AddOptions<SetupOptions>().BindConfiguration("Setup").ValidateDataAnnotations().ValidateOnStart();
        services.AddSingleton<FirstCoordinator>();
        services.Configure<HostOptions>(options => options.ShutdownTimeout = TimeSpan.FromSeconds(30));
    }

    /// <summary>Says where the server is and, on a first start, how the first coordinator comes in.</summary>
    public static void Announce(this WebApplication app, string? link)
    {
        // An address that means "every interface" is none that a browser can open.
        var url = (app.Urls.FirstOrDefault() ?? DefaultUrl).Replace("0.0.0.0", "localhost", StringComparison.Ordinal).Replace("[::]", "localhost", StringComparison.Ordinal);
        Console.WriteLine($"Bandtide is at {url}");
        if (link is not null)
        {
            Console.WriteLine($"There is no coordinator yet. This link works once: {url}{link}");
        }
    }
}
