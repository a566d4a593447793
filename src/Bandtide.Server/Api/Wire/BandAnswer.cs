namespace Bandtide.Server.Api;

/// <summary>A band of the plan.</summary>
/// <param name="Code">Its code in day sheets.</param>
/// <param name="Layer"><c>service</c> or <c>slice</c>.</param>
/// <param name="Name">Its name for people.</param>
/// <param name="Label">Name and limits in kHz.</param>
/// <param name="Segments">In ascending frequency.</param>
public sealed record BandAnswer(string Code, string Layer, string Name, string Label, IReadOnlyList<SegmentAnswer> Segments);
