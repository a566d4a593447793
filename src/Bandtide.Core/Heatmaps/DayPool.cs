using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>Pools day sheets to a heatmap: whatever month tiles do not hold.</summary>
/// <remarks>Stations are added one at a time and not kept whole: what stays is sums per cell, and for quantiles the values.</remarks>
public sealed class DayPool
{
    private readonly HeatmapQuery query;
    private readonly HeatmapRows rows;
    private readonly StationDays stationDays;
    private readonly Votes votes;
    private readonly SharedDays? shared;
    private readonly CellQuantiles? quantiles;
    private readonly int[] stations;
    private readonly int[] days;
    private readonly double[] daySpread;
    private readonly long[] sums;
    private readonly int[] counts;
    private readonly double[] means;

    /// <summary>Begins a pool.</summary>
    public DayPool(HeatmapQuery query, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(query);
        ArgumentNullException.ThrowIfNull(plan);
        this.query = query;
        rows = new(plan, query.Layer);
        stationDays = new(query, rows);
        votes = new(rows.Cells, query.Vote);
        shared = query is { Statistic: Statistic.Mean, Interval: IntervalChoice.Auto } ? new(rows.Cells) : null;
        quantiles = query.Statistic is Statistic.Median or Statistic.P10 or Statistic.P90 ? new(rows.Cells) : null;
        (stations, days, counts) = (new int[rows.Cells], new int[rows.Cells], new int[rows.Cells]);
        (daySpread, means, sums) = (new double[rows.Cells], new double[rows.Cells], new long[rows.Cells]);
    }

    /// <summary>Adds all days of one station in the selection, by ascending date; once per station.</summary>
    public void Add(Station station, IEnumerable<DaySheet> sheets)
    {
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(sheets);
        stationDays.Load(station, sheets);
        Average();
        votes.Add(station, means);
        shared?.Add(stationDays, means, query.Measure.Info().Resolution);
        quantiles?.Add(station, stationDays, means, counts);
        if (query is { Statistic: Statistic.Sd, Station: not null })
        {
            SpreadOverDays();
        }
    }

    /// <summary>The heatmap of everything added.</summary>
    public Heatmap ToHeatmap()
    {
        votes.Close();
        var info = query.Measure.Info();
        return rows.ToHeatmap(
            c =>
            {
                var value = Value(c, info.Resolution);
                var (lower, upper) = shared is null || days[c] == 0 ? (double.NaN, double.NaN) : shared.Interval(c, votes, info.IsShare);
                return new(value, lower, upper, stations[c], days[c]);
            },
            days);
    }

    private double Value(int c, double resolution) => query.Statistic switch
    {
        Statistic.Mean => votes.Mean(c),
        Statistic.Sd when query.Station is null => Math.Sqrt(votes.Variance(c)),
        Statistic.Sd => days[c] < 2 ? double.NaN : Math.Sqrt(daySpread[c] / (days[c] - 1)),
        Statistic.Median => quantiles!.Of(c, 0.5, resolution, query.Vote),
        Statistic.P10 => quantiles!.Of(c, 0.1, resolution, query.Vote),
        Statistic.P90 => quantiles!.Of(c, 0.9, resolution, query.Vote),
        _ => throw new InvalidOperationException($"No value for {query.Statistic}."),
    };

    private void Average()
    {
        Array.Clear(sums);
        Array.Clear(counts);
        for (var day = 0; day < stationDays.Count; day++)
        {
            var values = stationDays.Values(day);
            for (var c = 0; c < values.Length; c++)
            {
                if (values[c] != CellGrid.Missing)
                {
                    sums[c] += values[c];
                    counts[c]++;
                }
            }
        }

        var resolution = query.Measure.Info().Resolution;
        for (var c = 0; c < means.Length; c++)
        {
            var enough = counts[c] > 0 && counts[c] >= query.MinDays;
            means[c] = enough ? sums[c] * resolution / counts[c] : double.NaN;
            if (enough)
            {
                stations[c]++;
                days[c] += counts[c];
            }
        }
    }

    private void SpreadOverDays()
    {
        var resolution = query.Measure.Info().Resolution;
        for (var day = 0; day < stationDays.Count; day++)
        {
            var values = stationDays.Values(day);
            for (var c = 0; c < values.Length; c++)
            {
                if (values[c] != CellGrid.Missing && !double.IsNaN(means[c]))
                {
                    var deviation = (values[c] * resolution) - means[c];
                    daySpread[c] += deviation * deviation;
                }
            }
        }
    }
}
