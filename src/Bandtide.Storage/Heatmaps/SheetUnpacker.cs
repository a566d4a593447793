using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Storage.Days;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Unpacks of stored sheets what one measure needs, and leaves out those without it in a layer. Not thread-safe.</summary>
internal sealed class SheetUnpacker(Measure measure, IReadOnlyList<Band> layer)
{
    private readonly HashSet<short> bands = [.. layer.Select(band => band.Id)];
    private readonly Quantity[] quantities = measure.Info() is var info && info.IsDifference ? [info.Quantity, Quantity.Floor] : [info.Quantity];
    private int[] scratch = [];

    /// <summary>The days that have the measure in any cell of the layer.</summary>
    public List<DaySheet> Unpack(Station station, IEnumerable<(int Date, byte[] Sheet)> sheets)
    {
        var days = new List<DaySheet>();
        foreach (var (date, bytes) in sheets)
        {
            var cells = StoredSheets.Decode(station.Id, date, bytes, quantities);
            if (HasMeasure(cells))
            {
                days.Add(new(EpochDay.ToDate(date), cells));
            }
        }

        return days;
    }

    private bool HasMeasure(CellGrid cells)
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
