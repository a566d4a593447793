using System.Text.Json.Nodes;
using Bandtide.Core.Heatmaps;
using Bandtide.Server.Security;
using Microsoft.AspNetCore.OpenApi;
using Microsoft.OpenApi;

namespace Bandtide.Server.Api;

/// <summary>Completes the OpenAPI document: what the calls say in words, query values with their choices, examples, and keys.</summary>
internal static class ApiDescription
{
    private const string KeyScheme = "key";

    public static void Configure(OpenApiOptions options)
    {
        options.AddDocumentTransformer((document, _, _) =>
        {
            document.Info = new()
            {
                Title = "Bandtide",
                Version = "v1",
                Description = "Hour-by-hour short-wave band occupancy, pooled across stations. Times are UTC. Errors are problem details (RFC 9457) that name line, field and rule. Not for safety-of-life planning.",
            };
            document.Servers = [];
            var components = document.Components ??= new();
            components.SecuritySchemes ??= new Dictionary<string, IOpenApiSecurityScheme>(StringComparer.Ordinal);
            components.SecuritySchemes[KeyScheme] = new OpenApiSecurityScheme
            {
                Type = SecuritySchemeType.Http,
                Scheme = "bearer",
                Description = "A station's key writes its own station; a coordinator's key may do everything. Reading needs none.",
            };
            return Task.CompletedTask;
        });
        options.AddOperationTransformer(async (operation, context, ct) =>
        {
            if (context.Description.ActionDescriptor.EndpointMetadata.OfType<NeedsKey>().Any())
            {
                operation.Security = [new() { [new OpenApiSecuritySchemeReference(KeyScheme, context.Document)] = [] }];
            }

            if (context.Description.ActionDescriptor.EndpointMetadata.OfType<BodyNote>().FirstOrDefault() is { } body)
            {
                operation.RequestBody = await BodyAsync(body, context, ct);
            }

            AddParameters(operation);
            AddExamples(operation);
        });
    }

    private static async Task<OpenApiRequestBody> BodyAsync(BodyNote body, OpenApiOperationTransformerContext context, CancellationToken ct)
    {
        var shape = await context.GetOrCreateSchemaAsync(body.Shape, cancellationToken: ct);
        return new()
        {
            Required = true,
            Content = body.MediaTypes.ToDictionary(
                type => type,
                type => new OpenApiMediaType { Schema = type is "application/json" ? shape : new OpenApiSchema { Type = JsonSchemaType.String } },
                StringComparer.Ordinal),
        };
    }

    private static void AddParameters(OpenApiOperation operation)
    {
        if (string.Equals(operation.OperationId, "getHeatmap", StringComparison.Ordinal))
        {
            operation.Parameters = [.. ApiParameters.Heatmap];
        }

        foreach (var parameter in (operation.Parameters ?? []).OfType<OpenApiParameter>())
        {
            if (ApiParameters.Known.TryGetValue(parameter.Name ?? "", out var known))
            {
                parameter.Description ??= known.Description;
                parameter.Example ??= JsonValue.Create(known.Example);
            }
        }
    }

    private static void AddExamples(OpenApiOperation operation)
    {
        var id = operation.OperationId ?? "";
        foreach (var (type, media) in operation.RequestBody?.Content ?? new Dictionary<string, OpenApiMediaType>(StringComparer.Ordinal))
        {
            media.Example = ApiExamples.Request(id, type);
        }

        foreach (var (status, response) in operation.Responses ?? [])
        {
            foreach (var (type, media) in response.Content ?? new Dictionary<string, OpenApiMediaType>(StringComparer.Ordinal))
            {
                media.Example = string.Equals(type, Problems.ContentType, StringComparison.Ordinal)
                    ? ApiExamples.Problem(status)
                    : ApiExamples.Response(id, type);
            }

            response.Description = ApiExamples.StatusText(status) ?? response.Description;
        }
    }
}
