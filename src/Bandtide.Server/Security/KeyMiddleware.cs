using System.Globalization;
using System.Net;
using Bandtide.Server.Api;
using Bandtide.Storage.Keys;

namespace Bandtide.Server.Security;

/// <summary>
/// Reads <c>Authorization: Bearer</c>. A bad key is refused on every call, reads too; a call that needs a key is refused
/// without one before anything else is judged. Neither key nor header is ever logged.
/// </summary>
internal sealed class KeyMiddleware(RequestDelegate next, KeyStore keys, RequestLimits limits)
{
    private const string Scheme = "Bearer ";
    private const int LongestKey = 512;

    // What proxies add, and what is left of it where the host has taken the client's address from it.
    private static readonly string[] SignsOfProxy = ["Forwarded", "Via", "X-Forwarded-For", "X-Forwarded-Host", "X-Forwarded-Proto", "X-Original-For", "X-Real-IP"];

    public async Task InvokeAsync(HttpContext context)
    {
        var header = context.Request.Headers.Authorization;
        if (header.Count == 0)
        {
            if (context.GetEndpoint()?.Metadata.GetMetadata<NeedsKey>() is null)
            {
                await next(context);
            }
            else
            {
                await RefuseAsync(context, "This call needs a key: Authorization: Bearer <key>.");
            }

            return;
        }

        if (await ScopeAsync(context, header.ToString()) is not { } scope)
        {
            await RefuseAsync(context, "The key is not known, or was revoked.");
            return;
        }

        if (limits.Exceeded(scope.KeyId) is { } wait)
        {
            await TooManyAsync(context, wait);
            return;
        }

        context.Features.Set(new Caller(scope));
        await next(context);
    }

    private async Task<KeyScope?> ScopeAsync(HttpContext context, string header)
    {
        if (!header.StartsWith(Scheme, StringComparison.OrdinalIgnoreCase) || header.Length > Scheme.Length + LongestKey)
        {
            return null;
        }

        var scope = await keys.FindAsync(header[Scheme.Length..].Trim(), context.RequestAborted);
        return scope is { LoopbackOnly: true } && !IsFromThisMachine(context) ? null : scope;
    }

    // A forwarded request comes from elsewhere, though the proxy's connection comes from here.
    private static bool IsFromThisMachine(HttpContext context) =>
        context.Connection.RemoteIpAddress is { } address && IPAddress.IsLoopback(address)
        && !SignsOfProxy.Any(context.Request.Headers.ContainsKey);

    private async Task RefuseAsync(HttpContext context, string detail)
    {
        if (limits.FailuresExceeded(context.Connection.RemoteIpAddress) is { } wait)
        {
            await TooManyAsync(context, wait);
            return;
        }

        context.Response.Headers.WWWAuthenticate = "Bearer";
        await Problems.Of(StatusCodes.Status401Unauthorized, detail).ExecuteAsync(context);
    }

    private static Task TooManyAsync(HttpContext context, TimeSpan wait)
    {
        context.Response.Headers.RetryAfter = Math.Max(1, Math.Ceiling(wait.TotalSeconds)).ToString(CultureInfo.InvariantCulture);
        return Problems.Of(StatusCodes.Status429TooManyRequests, "Too many requests; wait as Retry-After says.").ExecuteAsync(context);
    }
}
