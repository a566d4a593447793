using Bandtide.Storage.Network;

namespace Bandtide.Storage.Model;

/// <summary>A region drawn up by a coordinator; those that exist by themselves are not stored.</summary>
internal sealed class RegionRow
{
    public int Id { get; set; }
    public required string Code { get; set; }
    public required string Name { get; set; }

    /// <summary><see cref="RegionKind.List"/> or <see cref="RegionKind.Locators"/>.</summary>
    public RegionKind Kind { get; set; }
}
