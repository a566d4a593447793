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

        list.Sort(static (a, b) => a.Value.CompareTo(b.Value));
        var neighbours = unit == VoteUnit.Square
            ? list.Select(entry => entry.Station).Distinct().CountBy(station => stations[station].Square, StringComparer.Ordinal).ToDictionary(StringComparer.Ordinal)
            : null;
        var (sorted, weights) = (new double[list.Count], new double[list.Count]);
        for (var i = 0; i < sorted.Length; i++)
        {
            var (square, days) = stations[list[i].Station];
            sorted[i] = list[i].Value * resolution;
            weights[i] = 1.0 / days[cell] / (neighbours?[square] ?? 1);
        }

        return WeightedQuantiles.Of(probability, sorted, weights);
    }
}
