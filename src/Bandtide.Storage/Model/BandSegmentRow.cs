namespace Bandtide.Storage.Model;

/// <summary>A segment of an added band.</summary>
internal sealed class BandSegmentRow
{
    public short BandId { get; set; }
    public int LowHz { get; set; }
    public int HighHz { get; set; }
}
