namespace Bandtide.Core.Heatmaps;

/// <summary>Whether levels of several stations may stand in one figure.</summary>
/// <param name="Refusal">Why they cannot be pooled at all, or <c>null</c>.</param>
/// <param name="Caution">Why they are pooled but not comparable, or <c>null</c>.</param>
public sealed record Comparability(string? Refusal, string? Caution);
