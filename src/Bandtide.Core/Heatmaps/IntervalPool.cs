using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>The 95 % interval of each cell's mean: of the mean that other days of such months, and other stations of such a region, would give.</summary>
/// <remarks>
/// Holds three planes for each date and a few for each cell, whatever the number of stations. Method: <see cref="DaySeries"/>,
/// <see cref="StationsAndDays"/>, and for shares <see cref="ShareInterval"/>. Where squares vote, the variance between
/// voters is that between squares, while dates are weighed as if stations voted.
/// </remarks>
/// <param name="query">Its measure and <c>mindays</c> count here.</param>
/// <param name="size">Number of cells.</param>
internal sealed class IntervalPool(HeatmapQuery query, int size)
{
    private readonly MeasureInfo measure = query.Measure.Info();
    private readonly Dictionary<int, DatePlanes> planesByDay = [];
    private readonly double[] squares = new double[size];
    private readonly int[] deviations = new int[size];
    private readonly int[] stationMonths = new int[size];
    private readonly double[] inverseLooks = new double[size];
    private readonly float[] weights = new float[size];
    private readonly float[] means = new float[size];
    private readonly float[] counts = new float[size];
    private readonly float[] stationSquares = new float[size];
    private DateTable? dates;

    /// <summary>Adds the days of one station.</summary>
    public void Add(StationDays days)
    {
        dates = null;
        Array.Clear(stationSquares);
        for (var cell = 0; cell < size; cell++)
        {
            double count = days.Days[cell] >= query.MinDays ? days.Days[cell] : 0;
            weights[cell] = count > 0 ? (float)(1 / count) : 0;
            inverseLooks[cell] += count > 0 ? days.InverseLooks[cell] / (count * count) : 0;
        }

        var isFull = days.Count >= query.MinDays && !days.Days.AsSpan().ContainsAnyExcept(days.Count);
        foreach (var month in days.Months)
        {
            BeginMonth(month);
            for (var day = month.FirstDay; day < month.FirstDay + month.DayCount; day++)
            {
                Add(days.Values(day), PlanesOf(days.Date(day).DayNumber), isFull);
            }
        }

        for (var cell = 0; cell < size; cell++)
        {
            squares[cell] += stationSquares[cell];
        }
    }

    /// <summary>The interval of a cell in the measure's unit; NaN where the data cannot tell, as from single days.</summary>
    public (double Lower, double Upper) Interval(int cell, StationVotes votes)
    {
        var mean = votes.Mean(cell) / measure.StepsPerUnit;
        var half = Uncertainty(cell, votes).HalfWidth95 / measure.StepsPerUnit;
        return !measure.IsShare ? (mean - half, mean + half)
            : double.IsNaN(half) ? (double.NaN, double.NaN)
            : ShareInterval.Around(mean, half, votes.Stations(cell) * (double)votes.Stations(cell) / inverseLooks[cell]);
    }

    /// <summary>The uncertainty of a cell's mean in stored units.</summary>
    internal MeanUncertainty Uncertainty(int cell, StationVotes votes)
    {
        dates ??= new(planesByDay);
        var days = dates.Read(cell);
        return StationsAndDays.Combine(
            votes.Variance(cell), votes.Voters(cell), DaySeries.Of(days), Rest(cell, votes.Stations(cell), days));
    }

    // The part of the day means' variance that is each station's own, as it enters the variance of their weighted mean.
    private double Rest(int cell, int stations, DaySpans days)
    {
        var (between, inverse, known, months, lastMonth) = (0.0, 0.0, 0, 0, -1);
        for (var i = 0; i < days.Days.Length; i++)
        {
            if (days.Counts[i] > 0)
            {
                between += (double)days.Counts[i] * days.Deviations[i] * days.Deviations[i];
                inverse += (double)days.Weights[i] * days.Weights[i] / days.Counts[i];
                months += days.Months[i] == lastMonth ? 0 : 1;
                lastMonth = days.Months[i];
                known++;
            }
        }

        var freedom = deviations[cell] - stationMonths[cell] - (known - months);
        return stations < 2 || freedom < 1 ? 0 : Math.Max(0, squares[cell] - between) / freedom * inverse / ((double)stations * stations);
    }

    private void Add(ReadOnlySpan<int> row, DatePlanes date, bool isFull)
    {
        if (!isFull)
        {
            DayKernel.AddDeviations(row, means, weights, counts, date, stationSquares);
            return;
        }

        DayKernel.AddFullDeviations(row, means, date.Deviations, stationSquares);
        date.FullWeight += weights[0];
        date.FullCount += (int)counts[0];
    }

    private void BeginMonth(StationMonth month)
    {
        for (var cell = 0; cell < size; cell++)
        {
            var days = month.Days[cell];
            var tells = days > 1 && weights[cell] > 0;
            means[cell] = days > 0 ? (float)month.Sums[cell] / days : 0;
            counts[cell] = tells ? 1 : 0;
            deviations[cell] += tells ? days : 0;
            stationMonths[cell] += tells ? 1 : 0;
        }
    }

    private DatePlanes PlanesOf(int day) => planesByDay.TryGetValue(day, out var planes) ? planes : planesByDay[day] = new(size);
}
