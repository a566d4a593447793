using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>The values of one station day by day in the rows and hours of a heatmap. Reused from station to station.</summary>
internal sealed class StationDays(HeatmapQuery query, HeatmapRows rows)
{
    private readonly List<int[]> planes = [];
    private readonly List<DateOnly> dates = [];
    private readonly int[] rowOf = new int[1024];
    private int[] scratch = [];

    /// <summary>Largest number of independent looks that an hour's sweeps are worth, one a minute: see the Methods page.</summary>
    public const int IndependentLooksPerHour = 60;

    public int Count => dates.Count;

    public DateOnly Date(int day) => dates[day];

    /// <summary>The day's values in stored units, hour-major, <see cref="CellGrid.Missing"/> where there is none.</summary>
    public ReadOnlySpan<int> Values(int day) => planes[day];

    /// <summary>Independent looks behind each cell, summed over the days.</summary>
    public int[] Looks { get; } = new int[rows.Cells];

    public void Load(Station station, IEnumerable<DaySheet> sheets)
    {
        dates.Clear();
        Array.Clear(Looks);
        foreach (var sheet in sheets)
        {
            if (planes.Count == dates.Count)
            {
                planes.Add(new int[rows.Cells]);
            }

            Place(sheet, planes[dates.Count], query.Clock == HourClock.Solar
                ? SolarClock.Shift(station.Position.LongitudeDegrees, YearMonth.Of(sheet.Date))
                : 0);
            dates.Add(sheet.Date);
        }
    }

    private void Place(DaySheet sheet, int[] plane, int shift)
    {
        Array.Fill(plane, CellGrid.Missing);
        var cells = sheet.Cells;
        var sweeps = cells.Plane(Quantity.Sweeps);
        if (scratch.Length < sweeps.Length)
        {
            scratch = new int[sweeps.Length];
        }

        var values = Measures.Values(cells, query.Measure, scratch);
        if (values.IsEmpty)
        {
            return;
        }

        var bandRows = rowOf.AsSpan(0, cells.BandCount);
        rows.Map(cells.BandIds, bandRows);
        for (var hour = 0; hour < 24; hour++)
        {
            var source = hour * cells.BandCount;
            var target = (hour + shift) % 24 * rows.Count;
            for (var b = 0; b < bandRows.Length; b++)
            {
                if (bandRows[b] >= 0 && values[source + b] != CellGrid.Missing && sweeps[source + b] >= query.MinSweeps)
                {
                    plane[target + bandRows[b]] = values[source + b];
                    Looks[target + bandRows[b]] += Math.Min(sweeps[source + b], IndependentLooksPerHour);
                }
            }
        }
    }
}
