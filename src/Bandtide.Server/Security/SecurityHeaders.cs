namespace Bandtide.Server.Security;

/// <summary>Response headers that keep a page to its own scripts and its own host.</summary>
internal static class SecurityHeaders
{
    // The hash is that of the empty style element that the plotting script adds.
    private static readonly System.Text.CompositeFormat Policy = System.Text.CompositeFormat.Parse(
        "default-src 'self'; script-src 'self' 'nonce-{0}'; style-src-elem 'self' 'sha256-47DEQpj8HBSa+/TImW+5JCeuQeRkm5NMpJWZG3hSuFU='; "
        + "style-src-attr 'unsafe-inline'; img-src 'self' data: blob:; connect-src 'self'; base-uri 'self'; object-src 'none'; "
        + "form-action 'self'; frame-ancestors 'none'");

    // Numbers need nothing.
    private const string DataPolicy = "default-src 'none'; frame-ancestors 'none'";

    public static IApplicationBuilder UseSecurityHeaders(this IApplicationBuilder app) => app.Use((context, next) =>
    {
        var headers = context.Response.Headers;
        headers.XContentTypeOptions = "nosniff";
        headers["Referrer-Policy"] = "same-origin";
        headers["Permissions-Policy"] = "geolocation=(), camera=(), microphone=()";
        headers.ContentSecurityPolicy = context.Request.Path.StartsWithSegments("/api", StringComparison.Ordinal) ? DataPolicy : PagePolicy(context);
        return next(context);
    });

    private static string PagePolicy(HttpContext context) => string.Format(
        System.Globalization.CultureInfo.InvariantCulture, Policy, context.RequestServices.GetRequiredService<ScriptNonce>().Value);
}
