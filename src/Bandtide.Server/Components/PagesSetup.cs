using Bandtide.Server.Components.Hours;
using Bandtide.Server.Components.Overview;

namespace Bandtide.Server.Components;

/// <summary>Registers and maps the pages.</summary>
internal static class PagesSetup
{
    /// <summary>Adds what the pages need.</summary>
    public static IServiceCollection AddPages(this IServiceCollection services)
    {
        services.AddRazorComponents().AddInteractiveServerComponents();
        services.AddSingleton<PageHandover>();
        services.AddSingleton<SiteFacts>();
        services.AddSingleton<HoursReader>();
        services.AddSingleton<StationReader>();
        services.AddExceptionHandler<PageFaultHandler>();
        return services;
    }

    /// <summary>Answers unknown addresses outside the programming interface with a page; goes before routing.</summary>
    public static WebApplication UsePages(this WebApplication app)
    {
        app.UseWhen(
            context => !context.Request.Path.StartsWithSegments("/api", StringComparison.Ordinal),
            pages => pages.UseStatusCodePagesWithReExecute("/not-found"));
        return app;
    }

    /// <summary>Maps the pages and their files.</summary>
    public static WebApplication MapPages(this WebApplication app)
    {
        app.MapStaticAssets();
        app.MapRazorComponents<App>().AddInteractiveServerRenderMode(options =>

            // The pages' own policy says it already, and more strictly.
            options.ContentSecurityFrameAncestorsPolicy = null);
        return app;
    }
}
