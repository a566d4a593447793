using System.IO.Compression;
using Bandtide.Core.Sheets;
using Microsoft.Net.Http.Headers;

namespace Bandtide.Server.Api;

/// <summary>Reads request bodies: media type, encoding, size.</summary>
internal static class RequestBody
{
    /// <summary>The media type of the body, or <c>null</c> when it is none of those allowed, in UTF-8, plain or gzip.</summary>
    public static string? MediaType(HttpRequest request, params ReadOnlySpan<string> allowed)
    {
        if (!MediaTypeHeaderValue.TryParse(request.ContentType, out var type) || !IsUtf8(type) || !HasKnownEncoding(request))
        {
            return null;
        }

        foreach (var candidate in allowed)
        {
            if (type.MediaType.Equals(candidate, StringComparison.OrdinalIgnoreCase))
            {
                return candidate;
            }
        }

        return null;
    }

    public static IResult Unsupported(string allowed) => Problems.Of(
        StatusCodes.Status415UnsupportedMediaType, $"The body must be {allowed}, in UTF-8, plain or with Content-Encoding: gzip.");

    /// <summary>The body as it was before it was compressed.</summary>
    public static Stream Decoded(HttpRequest request) =>
        IsGzip(request) ? new GZipStream(request.Body, CompressionMode.Decompress, leaveOpen: true) : request.Body;

    /// <summary>The whole decoded body, or the answer why not.</summary>
    /// <param name="request">The request.</param>
    /// <param name="limit">Most bytes, decoded.</param>
    /// <param name="ct">Cancels.</param>
    public static async Task<(ReadOnlyMemory<byte> Body, IResult? Problem)> ReadAsync(HttpRequest request, int limit, CancellationToken ct)
    {
        var stream = Decoded(request);
        var buffer = new byte[(int)Math.Clamp(request.ContentLength + 1 ?? 64 * 1024, 1024, limit + 1)];
        var length = 0;
        try
        {
            int read;
            while ((read = await stream.ReadAsync(buffer.AsMemory(length), ct)) > 0)
            {
                length += read;
                if (length > limit)
                {
                    return (default, Problems.Of(StatusCodes.Status413PayloadTooLarge, $"The body holds more than {limit} bytes."));
                }

                if (length == buffer.Length)
                {
                    Array.Resize(ref buffer, Math.Min(buffer.Length * 2, limit + 1));
                }
            }
        }
        catch (InvalidDataException)
        {
            return (default, Problems.Bad("", "gzip", "The body is not whole gzip data."));
        }
        finally
        {
            if (stream != request.Body)
            {
                await stream.DisposeAsync();
            }
        }

        return (buffer.AsMemory(0, length), null);
    }

    private static bool IsUtf8(MediaTypeHeaderValue type) =>
        !type.Charset.HasValue || HeaderUtilities.RemoveQuotes(type.Charset).Equals("utf-8", StringComparison.OrdinalIgnoreCase);

    private static bool IsGzip(HttpRequest request) =>
        string.Equals(request.Headers.ContentEncoding.ToString().Trim(), "gzip", StringComparison.OrdinalIgnoreCase);

    private static bool HasKnownEncoding(HttpRequest request) => IsGzip(request)
        || request.Headers.ContentEncoding.ToString().Trim() is var encoding
        && (encoding.Length == 0 || encoding.Equals("identity", StringComparison.OrdinalIgnoreCase));

    /// <summary>Most bytes of one day sheet.</summary>
    public const int DayLimit = BulkLimits.MaxDayBytes;

    /// <summary>Most bytes of a small JSON object.</summary>
    public const int ObjectLimit = 1_000_000;
}
