using Bandtide.Server.Security;
using Bandtide.Storage.Model;
using Scalar.AspNetCore;

namespace Bandtide.Server.Api;

/// <summary>Registers and maps everything under <c>/api/v1</c>, its description and the health checks.</summary>
internal static class ApiSetup
{
    private const string ReadFromElsewhere = "read";

    public static void AddApi(this IServiceCollection services)
    {
        services.AddOptions<RateLimitOptions>().BindConfiguration("RateLimits").ValidateDataAnnotations().ValidateOnStart();
        services.AddSingleton<RequestLimits>();
        services.AddScoped<ScriptNonce>();
        services.AddHttpContextAccessor();
        services.ConfigureHttpJsonOptions(options => WireJson.Configure(options.SerializerOptions));
        services.AddProblemDetails();
        services.AddExceptionHandler<FaultHandler>();
        services.AddAntiforgery();
        services.AddHealthChecks().AddDbContextCheck<BandtideContext>("store");
        services.AddOpenApi("v1", ApiDescription.Configure);
        services.AddCors(options => options.AddPolicy(ReadFromElsewhere, policy =>
            policy.AllowAnyOrigin().WithMethods("GET", "HEAD").WithHeaders("Accept", "If-None-Match").WithExposedHeaders("ETag")));
    }

    public static void UseApi(this WebApplication app)
    {
        app.UseCors();
        app.UseWhen(context => context.Request.Path.StartsWithSegments("/api", StringComparison.Ordinal), api =>
        {
            api.UseStatusCodePages(context => Problems.Of(
                context.HttpContext.Response.StatusCode, "There is nothing under this address or method.").ExecuteAsync(context.HttpContext));
            api.UseMiddleware<KeyMiddleware>();
        });
    }

    public static void MapApi(this WebApplication app)
    {
        var api = app.MapGroup(Routes.Base).RequireCors(ReadFromElsewhere);
        api.MapBands();
        api.MapRegions();
        api.MapStations();
        api.MapKeys();
        api.MapDays();
        api.MapBulk();
        api.MapHeatmap();
        api.MapCoverage();
        app.MapOpenApi("/openapi/{documentName}.json").RequireCors(ReadFromElsewhere);
        app.MapScalarApiReference("/reference", (options, context) => options
            .DisableDefaultFonts().DisableTelemetry().DisableAgent()
            .WithTitle("Bandtide API").WithNonce(context.RequestServices.GetRequiredService<ScriptNonce>().Value));
        app.MapHealthChecks("/health/live", new() { Predicate = _ => false });
        app.MapHealthChecks("/health/ready", new() { ResponseWriter = WriteHealthAsync });
    }

    private static Task WriteHealthAsync(HttpContext context, Microsoft.Extensions.Diagnostics.HealthChecks.HealthReport report) =>
        context.Response.WriteAsJsonAsync(new
        {
            status = report.Status.ToString(),
            checks = report.Entries.Select(entry => new { name = entry.Key, status = entry.Value.Status.ToString(), why = entry.Value.Description }),
        }, context.RequestAborted);
}
