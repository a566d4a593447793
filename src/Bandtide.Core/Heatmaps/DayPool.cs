using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Heatmaps;

/// <summary>Pools day sheets to a heatmap: whatever month tiles do not hold.</summary>
/// <remarks>
/// Stations are added one at a time and not kept: what stays is three planes for each date, or for quantiles the values of each
/// cell. Means, stations and days equal those of <see cref="TilePool"/>. The order of stations does not matter beyond the
/// last bits of a sum. Not thread-safe.
/// </remarks>
public sealed class DayPool
{
    private readonly HeatmapQuery query;
    private readonly PoolColumns columns;
    private readonly StationDays days;
    private readonly StationVotes votes;
    private readonly IntervalPool? intervals;
    private readonly QuantilePool? quantiles;
    private readonly double[]? daySquares;

    /// <summary>Begins a pool.</summary>
    /// <param name="query">The question: all of it but whose and when counts here.</param>
    /// <param name="plan">The bands.</param>
    public DayPool(HeatmapQuery query, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(query);
        ArgumentNullException.ThrowIfNull(plan);
        this.query = query;
        columns = new(plan, query.Layer);
        days = new(query, columns);
        intervals = query is { Statistic: Statistic.Mean, Interval: IntervalChoice.Auto } ? new(query, columns.Size) : null;
        votes = new(query, columns.Size, needsSpread: intervals is not null || query.Statistic == Statistic.Sd);
        quantiles = query.Statistic is Statistic.Median or Statistic.P10 or Statistic.P90 ? new(query, columns.Size) : null;
        daySquares = query is { Statistic: Statistic.Sd, Station: not null } ? new double[columns.Size] : null;
    }

    /// <summary>Adds all days of one station in the selection; once per station.</summary>
    /// <param name="station">The station: its square and longitude count.</param>
    /// <param name="sheets">Its current sheets, one for each date, in any order.</param>
    public void Add(Station station, IEnumerable<DaySheet> sheets)
    {
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(sheets);
        days.Load(station, sheets);
        votes.Add(station, days.Days, days.Sums);
        intervals?.Add(days);
        quantiles?.Add(station, days);
        if (daySquares is not null)
        {
            days.AddSquaredDeviations(daySquares);
        }
    }

    /// <summary>The heatmap of everything added. Call once.</summary>
    public Heatmap ToHeatmap()
    {
        votes.Count();
        var quantile = quantiles?.Quantiles(query.Statistic switch { Statistic.P10 => 0.1, Statistic.P90 => 0.9, _ => 0.5 });
        var steps = query.Measure.Info().StepsPerUnit;
        return columns.Assemble(votes, cell =>
        {
            var (lower, upper) = intervals is null || votes.Stations(cell) == 0 ? (double.NaN, double.NaN) : intervals.Interval(cell, votes);
            return new((quantile?[cell] ?? Value(cell)) / steps, lower, upper, votes.Stations(cell), votes.Days(cell));
        });
    }

    private double Value(int cell) =>
        query.Statistic == Statistic.Mean ? votes.Mean(cell)
        : daySquares is null ? Math.Sqrt(votes.Variance(cell))
        : votes.Days(cell) < 2 ? double.NaN
        : Math.Sqrt(daySquares[cell] / (votes.Days(cell) - 1));
}
