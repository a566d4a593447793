using Microsoft.OpenApi;

namespace Bandtide.Server.Api;

/// <summary>Response headers worth knowing, for the API's description.</summary>
internal static class ApiHeaders
{
    public static void Add(OpenApiResponse response, string operation, string status)
    {
        foreach (var (name, description) in Of(operation, status))
        {
            response.Headers ??= new Dictionary<string, IOpenApiHeader>(StringComparer.Ordinal);
            response.Headers[name] = new OpenApiHeader { Description = description, Schema = new OpenApiSchema { Type = JsonSchemaType.String } };
        }
    }

    private static IEnumerable<(string Name, string Description)> Of(string operation, string status) => (operation, status) switch
    {
        ("getHeatmap" or "getCoverage" or "getDay", "200" or "304") =>
            [("ETag", "Strong; its own for each representation. Send it back in If-None-Match."), ("Vary", "Accept")],
        (_, "201") => [("Location", "Address of what was made.")],
        (_, "401") => [("WWW-Authenticate", "Bearer")],
        (_, "429") => [("Retry-After", "Seconds to wait.")],
        _ => [],
    };
}
