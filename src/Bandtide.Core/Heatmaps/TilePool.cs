using Bandtide.Core.Bands;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>Pools month tiles to a heatmap: means over stations, and the standard deviation between station means.</summary>
/// <remarks>
/// A station's mean is the mean over all its days in the selection, however many months they lie in: tiles hold exact sums.
/// With the solar clock each month is turned by its own whole number of hours.
/// </remarks>
public sealed class TilePool
{
    private readonly HeatmapQuery query;
    private readonly HeatmapRows rows;
    private readonly Votes votes;
    private readonly int[] stations;
    private readonly int[] days;
    private readonly long[] stationSums;
    private readonly int[] stationDays;
    private readonly double[] stationMeans;

    /// <summary>Begins a pool.</summary>
    /// <param name="query">A question that tiles can answer: <see cref="HeatmapQuery.NeedsSheets"/> is false.</param>
    /// <param name="plan">The bands.</param>
    /// <exception cref="ArgumentException">The question needs day sheets.</exception>
    public TilePool(HeatmapQuery query, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(query);
        ArgumentNullException.ThrowIfNull(plan);
        if (query.NeedsSheets)
        {
            throw new ArgumentException("The question needs day sheets.", nameof(query));
        }

        this.query = query;
        rows = new(plan, query.Layer);
        votes = new(rows.Cells, query.Vote);
        stations = new int[rows.Cells];
        days = new int[rows.Cells];
        stationSums = new long[rows.Cells];
        stationDays = new int[rows.Cells];
        stationMeans = new double[rows.Cells];
    }

    /// <summary>Adds all tiles of one station; once per station.</summary>
    public void Add(Station station, IReadOnlyList<(YearMonth Month, MonthTile Tile)> months)
    {
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(months);
        Array.Clear(stationSums);
        Array.Clear(stationDays);
        foreach (var (month, tile) in months)
        {
            AddMonth(tile, query.Clock == HourClock.Solar ? SolarClock.Shift(station.Position.LongitudeDegrees, month) : 0);
        }

        var resolution = query.Measure.Info().Resolution;
        for (var c = 0; c < stationMeans.Length; c++)
        {
            var count = stationDays[c];
            if (count == 0 || count < query.MinDays)
            {
                stationMeans[c] = double.NaN;
                continue;
            }

            stationMeans[c] = stationSums[c] * resolution / count;
            stations[c]++;
            days[c] += count;
        }

        votes.Add(station, stationMeans);
    }

    /// <summary>The heatmap of everything added.</summary>
    public Heatmap ToHeatmap()
    {
        votes.Close();
        return rows.ToHeatmap(
            c => new(
                query.Statistic == Statistic.Sd ? Math.Sqrt(votes.Variance(c)) : votes.Mean(c),
                double.NaN,
                double.NaN,
                stations[c],
                days[c]),
            days);
    }

    private void AddMonth(MonthTile tile, int shift)
    {
        Span<int> rowOf = tile.BandCount <= 256 ? stackalloc int[tile.BandCount] : new int[tile.BandCount];
        rows.Map(tile.BandIds, rowOf);
        for (var hour = 0; hour < 24; hour++)
        {
            var source = hour * tile.BandCount;
            var target = (hour + shift) % 24 * rows.Count;
            for (var b = 0; b < rowOf.Length; b++)
            {
                if (rowOf[b] >= 0)
                {
                    stationSums[target + rowOf[b]] += tile.Sums[source + b];
                    stationDays[target + rowOf[b]] += tile.Days[source + b];
                }
            }
        }
    }
}
