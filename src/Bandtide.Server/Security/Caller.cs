using Bandtide.Core.Stations;
using Bandtide.Storage.Keys;

namespace Bandtide.Server.Security;

/// <summary>Who is calling: a feature of the request, set by <see cref="KeyMiddleware"/> when a good key was presented.</summary>
internal sealed record Caller(KeyScope Scope)
{
    /// <summary>The caller of a request, or <c>null</c> for a visitor.</summary>
    public static Caller? Of(HttpContext context) => context.Features.Get<Caller>();

    /// <summary>Whether a coordinator calls.</summary>
    public static bool IsCoordinator(HttpContext context) => Of(context)?.Scope.IsCoordinator == true;

    /// <summary>Whether the caller may write a station: its own operator or a coordinator.</summary>
    public static bool MayWrite(HttpContext context, Station station) =>
        Of(context) is { } caller && (caller.Scope.IsCoordinator || caller.Scope.StationId == station.Id);
}
