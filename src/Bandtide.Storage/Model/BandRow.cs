using Bandtide.Core.Bands;

namespace Bandtide.Storage.Model;

/// <summary>A band added by a coordinator; the standard bands are not stored.</summary>
internal sealed class BandRow
{
    /// <summary>The identity kept in sheets.</summary>
    public short Id { get; set; }

    public required string Code { get; set; }
    public BandLayer Layer { get; set; }
    public required string Name { get; set; }
}
