using Microsoft.AspNetCore.Diagnostics;

namespace Bandtide.Server.Api;

/// <summary>Turns what nobody expected into problem details under <c>/api</c>; the framework has logged it already.</summary>
internal sealed class FaultHandler : IExceptionHandler
{
    public async ValueTask<bool> TryHandleAsync(HttpContext httpContext, Exception exception, CancellationToken cancellationToken)
    {
        if (!httpContext.Request.Path.StartsWithSegments("/api", StringComparison.Ordinal))
        {
            return false;
        }

        var bad = exception as BadHttpRequestException;
        httpContext.Response.StatusCode = bad?.StatusCode ?? StatusCodes.Status500InternalServerError;
        await Problems.Of(
            httpContext.Response.StatusCode,
            bad is null ? "The server failed. Nothing was stored by this request unless a receipt said so." : "The request could not be read.")
            .ExecuteAsync(httpContext);
        return true;
    }
}
