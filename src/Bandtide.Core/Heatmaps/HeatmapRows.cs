using Bandtide.Core.Bands;

namespace Bandtide.Core.Heatmaps;

/// <summary>The rows a heatmap may have: the bands of one layer. Pools count in hour-major order, <c>hour * Count + row</c>.</summary>
internal sealed class HeatmapRows
{
    private readonly IReadOnlyList<Band> bands;
    private readonly Dictionary<short, int> rowOf;

    public HeatmapRows(BandPlan plan, BandLayer layer)
    {
        bands = plan.Layer(layer);
        rowOf = bands.Select((band, row) => (band.Id, row)).ToDictionary(pair => pair.Id, pair => pair.row);
    }

    public int Count => bands.Count;

    public int Cells => 24 * bands.Count;

    /// <summary>The row of each band, -1 for bands of another layer.</summary>
    public void Map(ReadOnlySpan<short> bandIds, Span<int> rows)
    {
        for (var b = 0; b < bandIds.Length; b++)
        {
            rows[b] = rowOf.GetValueOrDefault(bandIds[b], -1);
        }
    }

    /// <summary>A heatmap of the rows that anyone observed.</summary>
    /// <param name="cellAt">The cell at an hour-major place.</param>
    /// <param name="days">Station-days per place: a row without any is left out.</param>
    public Heatmap ToHeatmap(Func<int, HeatmapCell> cellAt, int[] days)
    {
        var observed = Enumerable.Range(0, Count).Where(row => Enumerable.Range(0, 24).Any(hour => days[(hour * Count) + row] > 0)).ToArray();
        var cells = new HeatmapCell[24 * observed.Length];
        for (var b = 0; b < observed.Length; b++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                cells[(b * 24) + hour] = cellAt((hour * Count) + observed[b]);
            }
        }

        return new([.. observed.Select(row => bands[row])], cells);
    }
}
