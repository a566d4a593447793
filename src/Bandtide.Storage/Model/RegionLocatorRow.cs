namespace Bandtide.Storage.Model;

/// <summary>A Maidenhead field or square whose stations belong to a region.</summary>
internal sealed class RegionLocatorRow
{
    public int RegionId { get; set; }

    /// <summary>2 or 4 characters in capitals, such as <c>KO33</c>.</summary>
    public required string Locator { get; set; }
}
