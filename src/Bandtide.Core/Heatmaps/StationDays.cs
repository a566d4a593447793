using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>The days of one station in the columns and hours of a pool. Used again from station to station.</summary>
/// <param name="query">Its measure, clock and <c>minsweeps</c> count here.</param>
/// <param name="columns">The pool's columns.</param>
internal sealed class StationDays(HeatmapQuery query, PoolColumns columns)
{
    /// <summary>Largest number of independent looks that an hour's sweeps are worth, one a minute: see the Methods page.</summary>
    public const int IndependentLooksPerHour = 60;

    private readonly List<DateOnly> dates = [];
    private readonly List<StationMonth> months = [];
    private readonly bool looksCount = query is { Statistic: Statistic.Mean, Interval: IntervalChoice.Auto } && query.Measure.Info().IsShare;
    private int[] values = [];
    private int[] scratch = [];
    private int monthCount;

    /// <summary>Number of days.</summary>
    public int Count => dates.Count;

    /// <summary>The months the days lie in, ascending.</summary>
    public IEnumerable<StationMonth> Months => months.Take(monthCount);

    /// <summary>Days with a value, of each cell.</summary>
    public int[] Days { get; } = new int[columns.Size];

    /// <summary>Sum of the values of each cell: whole numbers, exact.</summary>
    public double[] Sums { get; } = new double[columns.Size];

    /// <summary>
    /// Sum over the days with a value of 1/(independent looks), of each cell; kept for intervals of shares alone. A cell's looks are its
    /// sweeps, at most <see cref="IndependentLooksPerHour"/>, as if the band were a single channel: an assumption on the safe side.
    /// Whether carriers are steady is one judgement an hour.
    /// </summary>
    public float[] InverseLooks { get; } = new float[columns.Size];

    /// <summary>The date of a day.</summary>
    public DateOnly Date(int day) => dates[day];

    /// <summary>The values of a day in stored units, <see cref="CellGrid.Missing"/> where there is none.</summary>
    public ReadOnlySpan<int> Values(int day) => values.AsSpan(day * columns.Size, columns.Size);

    /// <summary>Replaces what is held by the days of a station.</summary>
    public void Load(Station station, IEnumerable<DaySheet> sheets)
    {
        dates.Clear();
        monthCount = 0;
        Array.Clear(Days);
        Array.Clear(Sums);
        Array.Clear(InverseLooks);
        var shift = 0;
        foreach (var sheet in sheets.OrderBy(sheet => sheet.Date))
        {
            var month = YearMonth.Of(sheet.Date);
            if (monthCount == 0 || months[monthCount - 1].Number != month.Number)
            {
                shift = query.Clock == HourClock.Solar ? SolarClock.Shift(station.Position.LongitudeDegrees, month) : 0;
                BeginMonth(month.Number);
            }

            Place(sheet, shift);
        }

        foreach (var month in Months)
        {
            DayKernel.AddMonth(month.Days, month.Sums, Days, Sums);
        }
    }

    /// <summary>Adds the squared deviations of the days from the station's mean to each cell.</summary>
    public void AddSquaredDeviations(Span<double> squares)
    {
        for (var day = 0; day < Count; day++)
        {
            var row = Values(day);
            for (var cell = 0; cell < row.Length; cell++)
            {
                if (row[cell] != CellGrid.Missing)
                {
                    var deviation = row[cell] - Sums[cell] / Days[cell];
                    squares[cell] += deviation * deviation;
                }
            }
        }
    }

    private void BeginMonth(int number)
    {
        if (months.Count == monthCount)
        {
            months.Add(new(columns.Size));
        }

        months[monthCount++].Reset(number, Count);
    }

    private void Place(DaySheet sheet, int shift)
    {
        var month = months[monthCount - 1];
        var row = NewRow();
        dates.Add(sheet.Date);
        month.DayCount++;
        var cells = sheet.Cells;
        if (query.Measure.Info().IsDifference && scratch.Length < cells.BandCount * CellGrid.Hours)
        {
            scratch = new int[cells.BandCount * CellGrid.Hours];
        }

        var plane = Measures.Values(cells, query.Measure, scratch);
        var copies = plane.IsEmpty ? default : columns.Copies(cells.BandIds, shift);
        if (copies.Length == 0 || !columns.AreFull(copies))
        {
            row.Fill(CellGrid.Missing);
        }

        var sweeps = cells.Plane(Quantity.Sweeps);
        foreach (var (source, target, length) in copies)
        {
            var placed = row.Slice(target, length);
            plane.Slice(source, length).CopyTo(placed);
            if (query.MinSweeps > 1)
            {
                DayKernel.DropFew(placed, sweeps.Slice(source, length), query.MinSweeps);
            }

            if (looksCount)
            {
                var most = query.Measure == Measure.Steady ? 1 : IndependentLooksPerHour;
                DayKernel.AddInverseLooks(placed, sweeps.Slice(source, length), most, InverseLooks.AsSpan(target, length));
            }
        }

        DayKernel.AddDay(row, month.Days, month.Sums);
    }

    private Span<int> NewRow()
    {
        var start = Count * columns.Size;
        if (values.Length < start + columns.Size)
        {
            Array.Resize(ref values, Math.Max(31 * columns.Size, 2 * values.Length));
        }

        return values.AsSpan(start, columns.Size);
    }
}
