using Bandtide.Server.Security;

namespace Bandtide.Server.Api;

/// <summary>What several endpoints say of themselves.</summary>
internal static class EndpointNotes
{
    /// <summary>Every status with which the endpoint may refuse; its answer is problem details.</summary>
    public static RouteHandlerBuilder Refuses(this RouteHandlerBuilder endpoint, params ReadOnlySpan<int> statuses)
    {
        foreach (var status in statuses)
        {
            endpoint.Produces<ApiProblem>(status, Problems.ContentType);
        }

        return endpoint;
    }

    /// <summary>Describes the body. Unlike the framework's own note it does not judge the request: the contract's order of judgement does.</summary>
    public static RouteHandlerBuilder TakesBody<T>(this RouteHandlerBuilder endpoint, params string[] mediaTypes) =>
        endpoint.WithMetadata(new BodyNote(typeof(T), mediaTypes));

    /// <summary>Requires a key: 401 without one, 403 when it is another's, 429 when it is used too fast.</summary>
    public static RouteHandlerBuilder WithKey(this RouteHandlerBuilder endpoint) =>
        endpoint.WithMetadata(NeedsKey.Instance).Refuses(403);
}
