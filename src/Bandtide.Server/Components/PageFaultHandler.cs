using Microsoft.AspNetCore.Diagnostics;

namespace Bandtide.Server.Components;

/// <summary>Shows a page when another one failed; the framework has logged the fault already.</summary>
/// <remarks>Plain text of its own, since what failed may be the pages themselves.</remarks>
internal sealed class PageFaultHandler : IExceptionHandler
{
    private const string Page = """
        <!DOCTYPE html>
        <html lang="en">
        <head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1">
        <title>The page failed · Bandtide</title><link rel="stylesheet" href="/css/app.css"></head>
        <body><div class="sheet"><header class="masthead"><div class="masthead-inner"><a class="name" href="/">Bandtide</a></div></header>
        <main><h1>The page failed</h1>
        <p class="lead">The server could not make this page. Nothing that was uploaded is lost.</p>
        <p>Try again in a moment; if it stays so, tell the people who run this network what you were looking at.</p>
        <p><a href="/">Go to the front page</a></p></main></div></body>
        </html>
        """;

    public async ValueTask<bool> TryHandleAsync(HttpContext httpContext, Exception exception, CancellationToken cancellationToken)
    {
        if (httpContext.Request.Path.StartsWithSegments("/api", StringComparison.Ordinal))
        {
            return false;
        }

        httpContext.Response.StatusCode = exception is BadHttpRequestException bad ? bad.StatusCode : StatusCodes.Status500InternalServerError;
        httpContext.Response.ContentType = "text/html; charset=utf-8";
        await httpContext.Response.WriteAsync(Page, cancellationToken);
        return true;
    }
}
