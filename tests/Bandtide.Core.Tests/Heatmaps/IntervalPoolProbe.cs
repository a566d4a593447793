using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Tests.Heatmaps;

/// <summary>The parts of a day pool put together by hand, to see the variance behind an interval. One band: cells are hours.</summary>
internal sealed class IntervalPoolProbe
{
    private readonly PoolColumns columns;
    private readonly StationDays days;
    private readonly StationVotes votes;
    private readonly IntervalPool intervals;
    private readonly int column;

    public IntervalPoolProbe(HeatmapQuery query)
    {
        columns = new(BandPlan.Standard, query.Layer);
        days = new(query, columns);
        votes = new(query, columns.Size, needsSpread: true);
        intervals = new(query, columns.Size);
        column = BandPlan.Standard.Layer(query.Layer).OrderBy(band => band.Id).ToList().FindIndex(band => band.Id == 6);
    }

    public void Add(Station station, IEnumerable<DaySheet> sheets)
    {
        days.Load(station, sheets);
        votes.Add(station, days.Days, days.Sums);
        intervals.Add(days);
    }

    public void Close() => votes.Count();

    /// <summary>Variance of an hour's mean, in squared stored units.</summary>
    public double Variance(int hour) => intervals.Uncertainty(hour * columns.Count + column, votes).Variance;
}
