using Bandtide.Core.Stations;

namespace Bandtide.Storage.Model;

/// <summary>A station as stored: a small table, read whole.</summary>
internal sealed class StationRow
{
    public int Id { get; set; }
    public required string Code { get; set; }
    public required string Name { get; set; }
    public double LatitudeDegrees { get; set; }
    public double LongitudeDegrees { get; set; }

    public LevelUnit LevelUnit { get; set; }

    public int ItuRegion { get; set; }

    /// <summary>Unix milliseconds, UTC.</summary>
    public long CreatedAt { get; set; }
}
