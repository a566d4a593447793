using Microsoft.Net.Http.Headers;

namespace Bandtide.Server.Api;

/// <summary>Chooses a representation by <c>Accept</c> (RFC 9110, 12.5.1).</summary>
internal static class Negotiation
{
    /// <summary>The best of the offered media types, the first of equals; <c>null</c> when none is accepted.</summary>
    /// <remarks>Without the header, and for <c>*/*</c>, the first offered. An unreadable header counts as absent.</remarks>
    public static string? Choose(HttpRequest request, params ReadOnlySpan<string> offered)
    {
        var header = request.Headers.Accept;
        if (header.Count == 0 || !MediaTypeHeaderValue.TryParseList(header, out var ranges) || ranges.Count == 0)
        {
            return offered[0];
        }

        var (best, bestQuality) = ((string?)null, 0.0);
        foreach (var candidate in offered)
        {
            var quality = Quality(candidate, ranges);
            if (quality > bestQuality)
            {
                (best, bestQuality) = (candidate, quality);
            }
        }

        return best;
    }

    // The most specific range that matches decides.
    private static double Quality(string candidate, IList<MediaTypeHeaderValue> ranges)
    {
        var type = new MediaTypeHeaderValue(candidate);
        var (quality, specificity) = (0.0, -1);
        foreach (var range in ranges)
        {
            var rank = range.MatchesAllTypes ? 0 : range.MatchesAllSubTypes ? 1 : 2;
            if (rank > specificity && type.IsSubsetOf(new(range.MediaType)))
            {
                (quality, specificity) = (range.Quality ?? 1, rank);
            }
        }

        return quality;
    }
}
