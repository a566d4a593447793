using Bandtide.Server.Hosting;
using Bandtide.Server.Security;
using Microsoft.AspNetCore.Http.Features;

namespace Bandtide.Server.Api;

/// <summary>Registers and maps everything under <c>/api/v1</c>, its description and the health checks.</summary>
internal static class ApiSetup
{
    private const string ReadFromElsewhere = "read";

    public static void AddApi(this IServiceCollection services)
    {
        services.AddOptions<RateLimitOptions>().BindConfiguration("RateLimits").ValidateDataAnnotations().ValidateOnStart();
        services.AddOptions<UploadOptions>().BindConfiguration("Uploads").ValidateDataAnnotations().ValidateOnStart();
        services.AddSingleton<RequestLimits>();
        services.AddScoped<ScriptNonce>();
        services.AddHttpContextAccessor();
        services.ConfigureHttpJsonOptions(options => WireJson.Configure(options.SerializerOptions));
        services.AddProblemDetails();
        services.AddExceptionHandler<FaultHandler>();
        services.AddAntiforgery();
        services.AddHealthChecks().AddCheck<StoreHealth>("store", timeout: TimeSpan.FromSeconds(5));
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
            api.Use(LiftBodyLimit);
            api.UseMiddleware<KeyMiddleware>();
        });
    }

    public static void MapApi(this WebApplication app)
    {
        // A key that is presented is judged on every call, also where none is needed.
        var api = app.MapGroup(Routes.Base).RequireCors(ReadFromElsewhere)
            .WithMetadata(new ProducesResponseTypeMetadata(401, typeof(ApiProblem), [Problems.ContentType]))
            .WithMetadata(new ProducesResponseTypeMetadata(429, typeof(ApiProblem), [Problems.ContentType]));
        api.MapBands();
        api.MapRegions();
        api.MapStations();
        api.MapKeys();
        api.MapDays();
        api.MapBulk();
        api.MapHeatmap();
        api.MapCoverage();
        app.MapOpenApi("/openapi/{documentName}.json").RequireCors(ReadFromElsewhere);
        app.MapHealthChecks("/health/live", new() { Predicate = _ => false });
        app.MapHealthChecks("/health/ready", new() { ResponseWriter = WriteHealthAsync });
    }

    // Every call limits its body itself. A refused body of any size is read to its end by the server, so that a client which
    // sends all before it reads learns why it was refused.
    private static Task LiftBodyLimit(HttpContext context, RequestDelegate next)
    {
        if (context.Features.Get<IHttpMaxRequestBodySizeFeature>() is { IsReadOnly: false } size)
        {
            size.MaxRequestBodySize = null;
        }

        return next(context);
    }

    private static Task WriteHealthAsync(HttpContext context, Microsoft.Extensions.Diagnostics.HealthChecks.HealthReport report) =>
        context.Response.WriteAsJsonAsync(new
        {
            status = report.Status.ToString(),
            checks = report.Entries.Select(entry => new { name = entry.Key, status = entry.Value.Status.ToString(), why = entry.Value.Description }),
        }, context.RequestAborted);
}
