using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>Keeps every station-day of every cell, for quantiles.</summary>
internal sealed class CellQuantiles(int cells)
{
    private readonly List<(int Value, int Station)>[] values = [.. Enumerable.Range(0, cells).Select(_ => new List<(int, int)>())];
    private readonly List<(string Square, int[] Days)> stations = [];

    public void Add(Station station, StationDays days, ReadOnlySpan<double> means, ReadOnlySpan<int> counts)
    {
        var place = stations.Count;
        stations.Add((station.Square.ToString(), counts.ToArray()));
        for (var day = 0; day < days.Count; day++)
        {
            var plane = days.Values(day);
            for (var c = 0; c < plane.Length; c++)
            {
                if (plane[c] != CellGrid.Missing && !double.IsNaN(means[c]))
                {
                    values[c].Add((plane[c], place));
                }
            }
        }
    }

    /// <summary>The quantile of a cell over station-days of weight 1/(days of the station), and 1/(stations of the square) where squares vote.</summary>
    public double Of(int cell, double probability, double resolution, VoteUnit unit)
    {
        var list = values[cell];
        if (list.Count == 0)
        {
            return double.NaN;
        }

        var neighbours = unit == VoteUnit.Square
            ? list.Select(entry => entry.Station).Distinct().CountBy(station => stations[station].Square, StringComparer.Ordinal).ToDictionary(StringComparer.Ordinal)
            : null;

        // Among equal values the lighter come first, so that the result does not depend on the order of stations.
        list.Sort((a, b) => a.Value != b.Value ? a.Value.CompareTo(b.Value) : Weight(a.Station).CompareTo(Weight(b.Station)));
        var (sorted, weights) = (new double[list.Count], new double[list.Count]);
        for (var i = 0; i < sorted.Length; i++)
        {
            sorted[i] = list[i].Value * resolution;
            weights[i] = Weight(list[i].Station);
        }

        return WeightedQuantiles.Of(probability, sorted, weights);

        double Weight(int station) => 1.0 / stations[station].Days[cell] / (neighbours?[stations[station].Square] ?? 1);
    }
}
