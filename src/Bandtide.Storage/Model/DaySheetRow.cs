namespace Bandtide.Storage.Model;

/// <summary>
/// The current revision of a station's day, be it a sheet or a withdrawal. Heatmaps read this table and no other revision.
/// </summary>
/// <remarks>Written and read by hand-written SQL for speed; this class gives the table its shape.</remarks>
internal sealed class DaySheetRow
{
    public int StationId { get; set; }

    /// <summary>Days since 1970-01-01.</summary>
    public int Date { get; set; }

    /// <summary>Unix milliseconds, UTC.</summary>
    public long ReceivedAt { get; set; }

    /// <summary>From 1, up with every stored change.</summary>
    public int Revision { get; set; }

    /// <summary>Number of cells; 0 marks a withdrawal.</summary>
    public int CellCount { get; set; }

    /// <summary>Hours with at least one cell, bit h for hour h.</summary>
    public int HoursMask { get; set; }

    public int BandCount { get; set; }

    /// <summary>16 bytes; <c>null</c> for a withdrawal.</summary>
    public byte[]? Checksum { get; set; }

    /// <summary>The packed cells; <c>null</c> for a withdrawal.</summary>
    public byte[]? Sheet { get; set; }
}
