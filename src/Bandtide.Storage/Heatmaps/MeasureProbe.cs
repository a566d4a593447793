using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Tells whether a sheet has a measure in any cell of a layer.</summary>
internal sealed class MeasureProbe(Measure measure, IReadOnlyList<Band> layer)
{
    private readonly HashSet<short> bands = [.. layer.Select(band => band.Id)];
    private int[] scratch = [];

    public bool Finds(CellGrid cells)
    {
        if (scratch.Length < cells.BandCount * CellGrid.Hours)
        {
            scratch = new int[cells.BandCount * CellGrid.Hours];
        }

        var values = Measures.Values(cells, measure, scratch);
        for (var i = 0; i < values.Length; i++)
        {
            if (values[i] != CellGrid.Missing && bands.Contains(cells.BandIds[i % cells.BandCount]))
            {
                return true;
            }
        }

        return false;
    }
}
