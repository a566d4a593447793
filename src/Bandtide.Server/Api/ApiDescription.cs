using System.Text.Json.Nodes;
using Bandtide.Server.Security;
using Microsoft.AspNetCore.OpenApi;
using Microsoft.OpenApi;

namespace Bandtide.Server.Api;

/// <summary>Completes the OpenAPI document: what the calls say in words, query values with their choices, examples, and keys.</summary>
internal static class ApiDescription
{
    private const string KeyScheme = "key";
    private const string Json = "application/json";

    private static readonly OpenApiSchema Text = new() { Type = JsonSchemaType.String };

    private static readonly (string Name, string Description)[] TagTexts =
    [
        ("Bands", "The band plan, the same for every station."),
        ("Regions", "Named sets of stations."),
        ("Stations", "Receivers and what was connected to them."),
        ("Keys", "A station's keys: made, listed without their text, revoked."),
        ("Days", "Day sheets: what a station reports for one UTC date, with every revision."),
        ("Heatmap", "Hour-by-band values pooled over stations and days."),
        ("Coverage", "Who reported when."),
    ];

    public static void Configure(OpenApiOptions options)
    {
        options.AddDocumentTransformer((document, _, _) =>
        {
            document.Info = new()
            {
                Title = "Bandtide",
                Version = "v1",
                Description = "Hour-by-hour short-wave band occupancy, pooled across stations. Times are UTC. Errors are problem details (RFC 9457) that name line, field and rule. What may be wrong is judged in this order: 401, 404, 403, 415 or 413, 406, 400. Not for safety-of-life planning.",
            };
            document.Servers = [];
            document.Tags = TagTexts.Select(tag => new OpenApiTag { Name = tag.Name, Description = tag.Description }).ToHashSet();
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
        options.AddSchemaTransformer(ApiSchemas.CompleteAsync);
        options.AddOperationTransformer(CompleteAsync);
    }

    private static async Task CompleteAsync(OpenApiOperation operation, OpenApiOperationTransformerContext context, CancellationToken ct)
    {
        var notes = context.Description.ActionDescriptor.EndpointMetadata;
        if (notes.OfType<NeedsKey>().Any())
        {
            operation.Security = [new() { [new OpenApiSecuritySchemeReference(KeyScheme, context.Document)] = [] }];
        }

        if (notes.OfType<BodyNote>().FirstOrDefault() is { } body)
        {
            operation.RequestBody = await BodyAsync(body, context, ct);
        }

        ApiParameters.Complete(operation);
        foreach (var (status, response) in (operation.Responses ?? []).Where(entry => entry.Value is OpenApiResponse).Select(entry => (entry.Key, (OpenApiResponse)entry.Value)))
        {
            foreach (var (type, media) in (response.Content ?? new Dictionary<string, OpenApiMediaType>(StringComparer.Ordinal)).ToList())
            {
                if (type is not (Json or Problems.ContentType))
                {
                    media.Schema = Text;
                }
            }

            response.Description = ApiExamples.StatusText(status) ?? response.Description;
            ApiHeaders.Add(response, operation.OperationId ?? "", status);
        }

        AddExamples(operation);
    }

    private static async Task<OpenApiRequestBody> BodyAsync(BodyNote body, OpenApiOperationTransformerContext context, CancellationToken ct)
    {
        var shape = await context.GetOrCreateSchemaAsync(body.Shape, cancellationToken: ct);
        return new()
        {
            Required = true,
            Content = body.MediaTypes.ToDictionary(
                type => type, type => new OpenApiMediaType { Schema = type is Json ? shape : Text }, StringComparer.Ordinal),
        };
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
        }
    }
}
