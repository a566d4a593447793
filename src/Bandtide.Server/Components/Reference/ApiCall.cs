namespace Bandtide.Server.Components.Reference;

/// <summary>One call of the programming interface as the reference page shows it.</summary>
/// <param name="Id">Name of the call, and of its place on the page.</param>
/// <param name="Method">HTTP method.</param>
/// <param name="Path">Path with its values in braces.</param>
/// <param name="Summary">What it does, in a sentence.</param>
/// <param name="Description">What else to know.</param>
/// <param name="NeedsKey">Whether a key is needed.</param>
/// <param name="Values">Path and query values.</param>
/// <param name="Bodies">What may be sent.</param>
/// <param name="Answers">What comes back, by status.</param>
internal sealed record ApiCall(
    string Id, string Method, string Path, string Summary, string? Description, bool NeedsKey, IReadOnlyList<ApiValue> Values,
    IReadOnlyList<ApiExample> Bodies, IReadOnlyList<ApiAnswer> Answers);
