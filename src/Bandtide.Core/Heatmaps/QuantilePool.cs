using Bandtide.Core.Geography;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Heatmaps;

/// <summary>Gathers the values of all station-days of each cell and gives their weighted quantiles.</summary>
/// <remarks>
/// A station-day weighs 1/(days of its station), and where squares vote 1/(stations of its square) of that. Values are whole numbers,
/// so those of a cell are counted into a table of its own range rather than sorted. What waits to be counted is folded into tables
/// of distinct values whenever it exceeds 64 MB; where squares vote it waits to the end, since only then the weights are known.
/// </remarks>
/// <param name="query">Its vote and <c>mindays</c> count here.</param>
/// <param name="size">Number of cells.</param>
internal sealed class QuantilePool(HeatmapQuery query, int size)
{
    private const long MaxWaiting = 32_000_000;

    private readonly List<StationRows> waiting = [];
    private readonly Dictionary<MaidenheadLocator, int[]> stationsInSquare = [];
    private readonly ValueCounter counter = new();
    private readonly int[] lows = Filled(size, int.MaxValue);
    private readonly int[] highs = Filled(size, int.MinValue);
    private ValueTable?[] folded = new ValueTable?[size];
    private long waitingValues;

    /// <summary>Adds the days of one station.</summary>
    public void Add(Station station, StationDays days)
    {
        for (var day = 0; day < days.Count; day++)
        {
            DayKernel.AddExtremes(days.Values(day), lows, highs);
        }

        var rows = new StationRows(station.Square, days, query.MinDays);
        waiting.Add(rows);
        waitingValues += (long)rows.Count * size;
        if (query.Vote == VoteUnit.Square)
        {
            CountInSquare(rows);
        }
        else if (waitingValues > MaxWaiting)
        {
            folded = Tables();
            waiting.Clear();
            waitingValues = 0;
        }
    }

    /// <summary>A quantile of each cell in stored steps, NaN without a value.</summary>
    public double[] Quantiles(double probability)
    {
        var quantiles = new double[size];
        Count((cell, table) => quantiles[cell] = table.Quantile(probability));
        return quantiles;
    }

    private ValueTable[] Tables()
    {
        var tables = new ValueTable[size];
        Count((cell, table) => tables[cell] = table);
        return tables;
    }

    private void Count(Action<int, ValueTable> take)
    {
        for (var first = 0; first < size; first += ValueCounter.Lanes)
        {
            var lanes = Math.Min(ValueCounter.Lanes, size - first);
            counter.Begin(first, lows.AsSpan(first, lanes), highs.AsSpan(first, lanes));
            for (var lane = 0; lane < lanes; lane++)
            {
                if (folded[first + lane] is { } before)
                {
                    counter.Add(lane, before);
                }
            }

            foreach (var rows in waiting)
            {
                counter.Add(rows, stationsInSquare.GetValueOrDefault(rows.Square));
            }

            for (var lane = 0; lane < lanes; lane++)
            {
                take(first + lane, counter.Table(lane));
            }
        }
    }

    private void CountInSquare(StationRows rows)
    {
        if (!stationsInSquare.TryGetValue(rows.Square, out var counts))
        {
            stationsInSquare.Add(rows.Square, counts = new int[size]);
        }

        for (var cell = 0; cell < size; cell++)
        {
            counts[cell] += rows.Days[cell] > 0 ? 1 : 0;
        }
    }

    private static int[] Filled(int count, int value)
    {
        var array = new int[count];
        Array.Fill(array, value);
        return array;
    }
}
