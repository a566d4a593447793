namespace Bandtide.Server.Api;

/// <summary>What body an endpoint takes, for the API's description.</summary>
/// <param name="Shape">The JSON shape.</param>
/// <param name="MediaTypes">Media types it may come in.</param>
internal sealed record BodyNote(Type Shape, IReadOnlyList<string> MediaTypes);
