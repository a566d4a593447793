namespace Bandtide.Server.Api;

/// <summary>Lets every address of the API that can be read be asked for its headers alone (RFC 9110, 9.3.2).</summary>
internal static class HeadRequests
{
    /// <summary>Answers <c>HEAD</c> as <c>GET</c>; the server itself leaves the content out. Goes before routing.</summary>
    public static IApplicationBuilder UseHeadRequests(this IApplicationBuilder app) => app.Use((context, next) =>
    {
        if (HttpMethods.IsHead(context.Request.Method) && context.Request.Path.StartsWithSegments("/api", StringComparison.Ordinal))
        {
            context.Request.Method = HttpMethods.Get;
        }

        return next(context);
    });
}
