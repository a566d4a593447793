namespace Bandtide.Storage.Model;

/// <summary>A superseded revision of a day, with the columns of <see cref="DaySheetRow"/>. Never changed, never read by heatmaps.</summary>
internal sealed class DayRevisionRow
{
    public int StationId { get; set; }

    /// <summary>Days since 1970-01-01.</summary>
    public int Date { get; set; }

    public int Revision { get; set; }

    /// <summary>Unix milliseconds, UTC.</summary>
    public long ReceivedAt { get; set; }

    public int CellCount { get; set; }
    public int HoursMask { get; set; }
    public int BandCount { get; set; }
    public byte[]? Checksum { get; set; }
    public byte[]? Sheet { get; set; }
}
