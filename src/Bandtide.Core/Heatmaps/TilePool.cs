using Bandtide.Core.Bands;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>
/// Pools month tiles to a heatmap: means (without interval) and the spread between stations. What needs the days one by one
/// is <see cref="DayPool"/>'s.
/// </summary>
/// <remarks>
/// The order of stations and months does not matter beyond the last bits of a sum. Memory is that of one heatmap, or of one
/// for each square where squares vote. Not thread-safe.
/// </remarks>
public sealed class TilePool
{
    private readonly HeatmapQuery query;
    private readonly PoolColumns columns;
    private readonly StationVotes votes;
    private readonly int[] stationDays;
    private readonly double[] stationSums;

    /// <summary>An empty pool.</summary>
    /// <param name="query">The question: its measure, statistic, clock, layer, vote and <c>mindays</c> count here.</param>
    /// <param name="plan">The network's bands.</param>
    /// <exception cref="ArgumentException">The question needs day sheets: <see cref="HeatmapQuery.NeedsSheets"/>.</exception>
    public TilePool(HeatmapQuery query, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(query);
        ArgumentNullException.ThrowIfNull(plan);
        if (query.NeedsSheets)
        {
            throw new ArgumentException("The question needs day sheets.", nameof(query));
        }

        this.query = query;
        columns = new(plan, query.Layer);
        votes = new(query, columns.Size, query.Statistic == Statistic.Sd);
        stationDays = new int[columns.Size];
        stationSums = new double[columns.Size];
    }

    /// <summary>Adds all months of one station. A station is added once.</summary>
    /// <param name="station">The station: its square and longitude count.</param>
    /// <param name="months">Its tiles of the query's measure, one for each month, in any order.</param>
    public void Add(Station station, IReadOnlyList<(YearMonth Month, MonthTile Tile)> months)
    {
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(months);
        if (months.Count == 1 && !votes.NeedsStationsOneByOne)
        {
            AddSingle(votes.PlanesOf(station), months[0].Tile, Copies(station, months[0]));
            return;
        }

        Array.Clear(stationDays);
        Array.Clear(stationSums);
        foreach (var month in months)
        {
            foreach (var (source, target, length) in Copies(station, month))
            {
                TileKernel.AddMonth(
                    month.Tile.Days.Slice(source, length),
                    month.Tile.Sums.Slice(source, length),
                    stationDays.AsSpan(target, length),
                    stationSums.AsSpan(target, length));
            }
        }

        votes.Add(station, stationDays, stationSums);
    }

    /// <summary>The heatmap of all that was added. Intervals are NaN. Call once.</summary>
    public Heatmap ToHeatmap()
    {
        votes.Count();
        var steps = query.Measure.Info().StepsPerUnit;
        return columns.Assemble(votes, cell =>
        {
            var value = query.Statistic == Statistic.Sd ? Math.Sqrt(votes.Variance(cell)) : votes.Mean(cell);
            return new(value / steps, double.NaN, double.NaN, votes.Stations(cell), votes.Days(cell));
        });
    }

    private void AddSingle(VotePlanes planes, MonthTile tile, ReadOnlySpan<RowCopy> copies)
    {
        foreach (var (source, target, length) in copies)
        {
            TileKernel.AddMeans(tile.Days.Slice(source, length), tile.Sums.Slice(source, length), planes, target, query.MinDays);
        }
    }

    private ReadOnlySpan<RowCopy> Copies(Station station, (YearMonth Month, MonthTile Tile) month) => columns.Copies(
        month.Tile.BandIds, query.Clock == HourClock.Solar ? SolarClock.Shift(station.Position.LongitudeDegrees, month.Month) : 0);
}
