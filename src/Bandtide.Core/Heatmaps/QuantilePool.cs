using Bandtide.Core.Geography;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Heatmaps;

/// <summary>Gathers the values of all station-days of each cell and gives their weighted quantiles.</summary>
/// <remarks>
/// Values are whole numbers, so those of a cell are counted into a table of its own range rather than sorted. What waits to
/// be counted is folded in whenever it grows large, so that memory is bounded by the number of distinct values.
/// </remarks>
/// <param name="query">Its vote and <c>mindays</c> count here.</param>
/// <param name="size">Number of cells.</param>
internal sealed class QuantilePool(HeatmapQuery query, int size)
{
    private const int MaxWaiting = 16_000_000;

    private readonly List<StationValues> waiting = [];
    private readonly ValueTable?[] folded = new ValueTable?[size];
    private readonly ValueCounter counter = new();
    private readonly Dictionary<MaidenheadLocator, int[]> stationsInSquare = [];
    private int waitingValues;

    /// <summary>Adds the days of one station.</summary>
    public void Add(Station station, StationDays days)
    {
        var values = StationValues.From(station.Square, days, query.MinDays);
        waiting.Add(values);
        waitingValues += values.Count;
        if (query.Vote == VoteUnit.Square)
        {
            var counts = stationsInSquare.TryGetValue(station.Square, out var known) ? known : stationsInSquare[station.Square] = new int[size];
            for (var cell = 0; cell < size; cell++)
            {
                counts[cell] += values.Of(cell).IsEmpty ? 0 : 1;
            }
        }
        else if (waitingValues > MaxWaiting)
        {
            Fold();
        }
    }

    /// <summary>The quantile of a cell in stored steps, or NaN without a value.</summary>
    public double Quantile(int cell, double probability) => Table(cell)?.Quantile(probability) ?? double.NaN;

    private void Fold()
    {
        for (var cell = 0; cell < size; cell++)
        {
            folded[cell] = Table(cell);
        }

        waiting.Clear();
        waitingValues = 0;
    }

    private ValueTable? Table(int cell)
    {
        counter.Begin(folded[cell], waiting, cell);
        foreach (var station in waiting)
        {
            var values = station.Of(cell);
            if (!values.IsEmpty)
            {
                var stations = query.Vote == VoteUnit.Square ? stationsInSquare[station.Square][cell] : 1;
                counter.Add(values, 1.0 / ((double)values.Length * stations));
            }
        }

        return counter.End();
    }
}
