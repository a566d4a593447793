namespace Bandtide.Server.Components.Reference;

/// <summary>A path or query value.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Place"><c>path</c> or <c>query</c>.</param>
/// <param name="Description">What it means.</param>
/// <param name="Choices">The words it may be, if they are few.</param>
/// <param name="Fallback">What it is when left out.</param>
internal sealed record ApiValue(string Name, string Place, string? Description, IReadOnlyList<string> Choices, string? Fallback);
