namespace Bandtide.Storage.Model;

/// <summary>Membership of a station in a listed region.</summary>
internal sealed class RegionStationRow
{
    public int RegionId { get; set; }
    public int StationId { get; set; }
}
