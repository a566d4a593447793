using Bandtide.Core.Bands;

namespace Bandtide.Core.Heatmaps;

/// <summary>Hour-by-band values pooled over stations and days.</summary>
public sealed class Heatmap
{
    /// <summary>Fewer station-days than this count as "few data".</summary>
    public const int FewDays = 5;

    private readonly HeatmapCell[] cells;

    /// <summary>Takes over the cells, band-major: index <c>band * 24 + hour</c>.</summary>
    /// <exception cref="ArgumentException">Not 24 cells per band.</exception>
    public Heatmap(IReadOnlyList<Band> bands, HeatmapCell[] cells)
    {
        ArgumentNullException.ThrowIfNull(bands);
        ArgumentNullException.ThrowIfNull(cells);
        if (cells.Length != bands.Count * 24)
        {
            throw new ArgumentException("Needs 24 cells per band.", nameof(cells));
        }

        (Bands, this.cells) = (bands, cells);
    }

    /// <summary>The bands anyone in the selection observed, in ascending frequency.</summary>
    public IReadOnlyList<Band> Bands { get; }

    /// <summary>The cell of a band (its place in <see cref="Bands"/>) and hour 0 to 23 of the asked clock.</summary>
    public HeatmapCell this[int band, int hour] => cells[band * 24 + hour];

    /// <summary>All cells, band-major.</summary>
    public ReadOnlySpan<HeatmapCell> Cells => cells;
}
