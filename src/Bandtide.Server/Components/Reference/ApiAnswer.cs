namespace Bandtide.Server.Components.Reference;

/// <summary>An answer.</summary>
/// <param name="Status">HTTP status.</param>
/// <param name="Description">When it comes.</param>
/// <param name="Bodies">Examples, for answers that are not problem details.</param>
internal sealed record ApiAnswer(string Status, string Description, IReadOnlyList<ApiExample> Bodies);
