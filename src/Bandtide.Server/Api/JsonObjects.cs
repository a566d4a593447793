using System.Text.Json;
using System.Text.Json.Serialization;
using Bandtide.Core.Sheets;

namespace Bandtide.Server.Api;

/// <summary>Reads small JSON objects, naming the field that is wrong.</summary>
internal static class JsonObjects
{
    public static JsonSerializerOptions Options { get; } = new(JsonSerializerDefaults.Web)
    {
        NumberHandling = JsonNumberHandling.Strict,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
    };

    /// <summary>The object, or the answer why not: 415, 413, 406 or 400.</summary>
    public static async Task<(T? Value, IResult? Problem)> ReadAsync<T>(HttpContext context, CancellationToken ct)
        where T : class
    {
        if (RequestBody.MediaType(context.Request, "application/json") is null)
        {
            return (null, RequestBody.Unsupported("application/json"));
        }

        var (body, problem) = await RequestBody.ReadAsync(context.Request, RequestBody.ObjectLimit, ct);
        if (problem is not null)
        {
            return (null, problem);
        }

        if (Negotiation.Choose(context.Request, "application/json") is null)
        {
            return (null, Problems.NotAcceptable("application/json"));
        }

        try
        {
            return JsonSerializer.Deserialize<T>(body.Span, Options) is { } value
                ? (value, null)
                : (null, Problems.Bad("", SheetRule.JsonSyntax, "The body must be a JSON object."));
        }
        catch (JsonException e)
        {
            var field = e.Path?.TrimStart('$', '.') ?? "";
            return (null, Problems.Bad(field, SheetRule.JsonSyntax, field.Length == 0 ? "The body is not the JSON object expected." : $"{field} is not of the kind expected."));
        }
    }
}
