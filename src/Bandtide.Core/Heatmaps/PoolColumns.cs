using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Tiles;

namespace Bandtide.Core.Heatmaps;

/// <summary>
/// The columns of a pool: every band of a layer by ascending identity, as tiles and sheets hold theirs, so that most stations'
/// planes are added in one stretch. Cells are hour-major, index <c>hour * Count + column</c>.
/// </summary>
/// <remarks>Remembers the copies for the bands seen last: stations of a network tend to report the same ones. Not thread-safe.</remarks>
internal sealed class PoolColumns
{
    private readonly Band[] bands;
    private readonly short[] ids;
    private readonly RowCopy[]?[] copiesByShift = new RowCopy[CellGrid.Hours][];
    private short[] lastIds = [];
    private BandRun[] lastRuns = [];

    public PoolColumns(BandPlan plan, BandLayer layer)
    {
        bands = [.. plan.Layer(layer).OrderBy(band => band.Id)];
        ids = [.. bands.Select(band => band.Id)];
    }

    /// <summary>Number of bands of the layer.</summary>
    public int Count => bands.Length;

    /// <summary>Number of cells: 24 for each band.</summary>
    public int Size => CellGrid.Hours * bands.Length;

    /// <summary>How a station's cells come into the pool.</summary>
    /// <param name="bandIds">The station's bands, ascending.</param>
    /// <param name="shift">0 to 23: UTC hour h goes to hour (h + shift) mod 24.</param>
    public ReadOnlySpan<RowCopy> Copies(ReadOnlySpan<short> bandIds, int shift)
    {
        if (!bandIds.SequenceEqual(lastIds))
        {
            lastIds = bandIds.ToArray();
            lastRuns = BandRun.Between(bandIds, ids);
            Array.Clear(copiesByShift);
        }

        return copiesByShift[shift] ??= Build(shift);
    }

    /// <summary>Whether copies reach every cell.</summary>
    public bool AreFull(ReadOnlySpan<RowCopy> copies)
    {
        var reached = 0;
        foreach (var copy in copies)
        {
            reached += copy.Length;
        }

        return reached == Size;
    }

    /// <summary>The heatmap of all bands that have a station in any hour, by ascending frequency.</summary>
    /// <param name="votes">Tells which cells have one.</param>
    /// <param name="cell">Gives the value of a cell of the pool; may be called for cells without a station.</param>
    public Heatmap Assemble(StationVotes votes, Func<int, HeatmapCell> cell)
    {
        var columns = Enumerable.Range(0, Count)
            .Where(column => Enumerable.Range(0, CellGrid.Hours).Any(hour => votes.Stations(hour * Count + column) > 0))
            .OrderBy(column => bands[column].LowHz).ToArray();
        var cells = new HeatmapCell[columns.Length * CellGrid.Hours];
        for (var b = 0; b < columns.Length; b++)
        {
            for (var hour = 0; hour < CellGrid.Hours; hour++)
            {
                cells[b * CellGrid.Hours + hour] = cell(hour * Count + columns[b]);
            }
        }

        return new([.. columns.Select(column => bands[column])], cells);
    }

    private RowCopy[] Build(int shift)
    {
        if (lastRuns is [{ Source: 0 } only] && only.Length == lastIds.Length && only.Length == Count)
        {
            // The same bands: a rotation is two stretches, one before and one after midnight.
            var before = (CellGrid.Hours - shift) * Count;
            RowCopy[] whole = [new(0, shift * Count, before), new(before, 0, shift * Count)];
            return shift == 0 ? whole[..1] : whole;
        }

        var copies = new List<RowCopy>();
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            var target = (hour + shift) % CellGrid.Hours;
            copies.AddRange(lastRuns.Select(run => new RowCopy(hour * lastIds.Length + run.Source, target * Count + run.Target, run.Length)));
        }

        return [.. copies];
    }
}
