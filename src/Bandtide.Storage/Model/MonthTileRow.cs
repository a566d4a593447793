using Bandtide.Core.Heatmaps;

namespace Bandtide.Storage.Model;

/// <summary>Statistics of one station, month and measure, derived from its day sheets.</summary>
internal sealed class MonthTileRow
{
    public int StationId { get; set; }

    /// <summary>12 x year + month - 1.</summary>
    public int Month { get; set; }

    /// <summary>A <see cref="Core.Heatmaps.Measure"/> as its number.</summary>
    public Measure Measure { get; set; }

    /// <summary>The packed tile.</summary>
    public required byte[] Tile { get; set; }
}
