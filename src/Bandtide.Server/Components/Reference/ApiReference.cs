using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Nodes;
using Bandtide.Server.Api;
using Microsoft.OpenApi;

namespace Bandtide.Server.Components.Reference;

/// <summary>Makes the reference page's content out of the OpenAPI document: there is one description of the interface.</summary>
internal static class ApiReference
{
    private static readonly JsonSerializerOptions Readable = new() { WriteIndented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>All calls by tag, in the document's order.</summary>
    public static IReadOnlyList<IGrouping<string, ApiCall>> Of(OpenApiDocument document) =>
    [
        .. document.Paths
            .SelectMany(path => path.Value.Operations ?? [], (path, operation) => (Path: path.Key, Method: operation.Key, Operation: operation.Value))
            .GroupBy(call => call.Operation.Tags?.FirstOrDefault()?.Name ?? "Other", call => Call(call.Path, call.Method, call.Operation), StringComparer.Ordinal),
    ];

    private static ApiCall Call(string path, HttpMethod method, OpenApiOperation operation) => new(
        operation.OperationId ?? path,
        method.Method,
        path,
        operation.Summary ?? "",
        operation.Description,
        operation.Security is { Count: > 0 },
        [.. (operation.Parameters ?? []).Select(Value)],
        Examples(operation.RequestBody?.Content),
        [.. (operation.Responses ?? []).Select(answer => new ApiAnswer(answer.Key, answer.Value.Description ?? "", Examples(answer.Value.Content)))]);

    private static ApiValue Value(IOpenApiParameter value) => new(
        value.Name ?? "",
        value.In == ParameterLocation.Path ? "path" : "query",
        value.Description,
        [.. (value.Schema?.Enum ?? []).Select(choice => choice.ToString())],
        value.Schema?.Default?.ToString());

    private static IReadOnlyList<ApiExample> Examples(IDictionary<string, OpenApiMediaType>? content) =>
    [
        .. (content ?? new Dictionary<string, OpenApiMediaType>(StringComparer.Ordinal))
            .Where(body => !string.Equals(body.Key, Problems.ContentType, StringComparison.Ordinal) && body.Value.Example is not null)
            .Select(body => new ApiExample(body.Key, Text(body.Value.Example!))),
    ];

    private static string Text(JsonNode example) =>
        example is JsonValue value && value.TryGetValue(out string? text) ? text.TrimEnd('\n') : example.ToJsonString(Readable);
}
