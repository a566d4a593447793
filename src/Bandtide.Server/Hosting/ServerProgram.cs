using Bandtide.Server.Api;
using Bandtide.Server.Components;
using Bandtide.Server.Demo;
using Bandtide.Server.Security;
using Bandtide.Storage;
using Bandtide.Storage.Maintenance;
using Microsoft.Extensions.Options;

namespace Bandtide.Server.Hosting;

/// <summary>The program from its command line to its exit code.</summary>
internal static class ServerProgram
{
    /// <summary>Runs a command on the store, or the server until it is asked to stop.</summary>
    /// <returns>0 when it succeeded, 1 otherwise.</returns>
    public static async Task<int> RunAsync(ServerArguments arguments)
    {
        await using var app = Build(arguments);
        var store = app.Services.GetRequiredService<StoreMaintenance>();
        if (arguments.Command.Count > 0)
        {
            return await StoreCommands.RunAsync(arguments.Command, store, app.Lifetime.ApplicationStopping);
        }

        // Wrong settings end the start before the store is touched.
        app.Services.GetRequiredService<IStartupValidator>().Validate();
        await store.MigrateAsync(app.Lifetime.ApplicationStopping);
        if (arguments.IsDemo)
        {
            await ActivatorUtilities.CreateInstance<DemoLoader>(app.Services, Console.Out).LoadAsync(app.Lifetime.ApplicationStopping);
        }

        var link = await app.Services.GetRequiredService<FirstCoordinator>().PrepareAsync(app.Lifetime.ApplicationStopping);
        await app.StartAsync();
        app.Announce(link);
        await app.WaitForShutdownAsync();
        return 0;
    }

    private static WebApplication Build(ServerArguments arguments)
    {
        // The program's folder holds wwwroot and appsettings wherever the command is typed.
        var builder = WebApplication.CreateBuilder(new WebApplicationOptions { Args = arguments.Settings, ContentRootPath = AppContext.BaseDirectory });
        builder.WebHost.UseStaticWebAssets();
        builder.WebHost.UseDefaultUrl(builder.Configuration);
        var store = StoreSettings.Read(builder.Configuration);
        builder.Services.AddBandtideStorage(store);
        builder.Services.AddHosting(store.DataDirectory);
        builder.Services.AddApi();
        builder.Services.AddPages();

        var app = builder.Build();
        app.UseExceptionHandler();
        app.UseSecurityHeaders();
        app.UsePages();
        app.UseHeadRequests();
        app.UseRouting();
        app.UseApi();
        app.UseAntiforgery();
        app.MapApi();
        app.MapSetupPage();
        app.MapPages();
        return app;
    }
}
