using System.Security.Cryptography;
using System.Text;
using Microsoft.Net.Http.Headers;

namespace Bandtide.Server.Api;

/// <summary>Strong entity tags (RFC 9110, 8.8.3).</summary>
internal static class Tags
{
    // Another build may write the same values otherwise.
    private static readonly string Build = typeof(Tags).Assembly.ManifestModule.ModuleVersionId.ToString("N");

    /// <summary>A tag that is equal exactly when all parts are, and the program is the same.</summary>
    public static string Of(params ReadOnlySpan<string> parts) =>
        $"\"{Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes($"{Build}\n{string.Join('\n', parts!)}")).AsSpan(0, 12))}\"";

    /// <summary>Sets the tag and says whether the reader has this version already.</summary>
    public static bool NotModified(HttpContext context, string tag)
    {
        context.Response.Headers.ETag = tag;
        context.Response.Headers.CacheControl = "no-cache";
        return context.Request.Headers.IfNoneMatch.Count > 0
            && EntityTagHeaderValue.TryParseList(context.Request.Headers.IfNoneMatch, out var known)
            && known.Any(entry => entry.Tag == "*" || entry.Tag == tag);
    }
}
