namespace Bandtide.Server.Components;

/// <summary>What every page has to say about the data it shows.</summary>
internal sealed class SiteFacts
{
    /// <summary>Whether the store was filled with the invented demonstration scenario.</summary>
    public bool IsDemonstration { get; set; }
}
