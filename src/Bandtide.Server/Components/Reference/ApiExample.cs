namespace Bandtide.Server.Components.Reference;

/// <summary>A body with its media type.</summary>
/// <param name="MediaType">The media type.</param>
/// <param name="Text">An example as it travels.</param>
internal sealed record ApiExample(string MediaType, string Text);
