using Bandtide.Core.Sheets;
using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>
/// The 95 % interval of a mean over stations that share days: of the mean that other days of such a month, and other
/// stations of such a region, would give.
/// </summary>
/// <remarks>
/// Two-way variance components: value = mean + station + day + rest, with days resembling their neighbours
/// (first-order autoregression, <see cref="DaySeries"/>). The variance between voters' means over their number holds the
/// station part and the rest; the series of day means after each station's own mean is taken off holds the day part,
/// from which the rest's share is subtracted (analysis of variance: Searle, Casella &amp; McCulloch 1992, Variance Components, ch. 4).
/// Both parts are widened by their own Student factor and added in squares. A single station has the day part alone.
/// Shares go through the logit (delta method) of (k + 0.5)/(n + 1), n counting independent looks, so that an interval stays
/// in 0 to 1 and has a width at 0 and 1 too; the variance is not taken below that of n looks.
/// Memory: one sum and count per date and cell, whatever the number of stations.
/// </remarks>
internal sealed class SharedDays(int cells)
{
    private readonly SortedDictionary<DateOnly, (double[] Sum, int[] Count)> byDate = [];
    private readonly double[] withinStations = new double[cells];
    private readonly int[] looks = new int[cells];
    private readonly int[] stations = new int[cells];
    private (DateOnly First, (double[] Sum, int[] Count)?[] Days)? calendar;

    public void Add(StationDays days, ReadOnlySpan<double> means, double resolution)
    {
        calendar = null;
        for (var day = 0; day < days.Count; day++)
        {
            var date = days.Date(day);
            if (!byDate.TryGetValue(date, out var sums))
            {
                byDate.Add(date, sums = (new double[cells], new int[cells]));
            }

            var values = days.Values(day);
            for (var c = 0; c < values.Length; c++)
            {
                if (values[c] != CellGrid.Missing && !double.IsNaN(means[c]))
                {
                    var deviation = (values[c] * resolution) - means[c];
                    sums.Sum[c] += deviation;
                    sums.Count[c]++;
                    withinStations[c] += deviation * deviation;
                }
            }
        }

        for (var c = 0; c < cells; c++)
        {
            if (!double.IsNaN(means[c]))
            {
                looks[c] += days.Looks[c];
                stations[c]++;
            }
        }
    }

    /// <summary>The interval of a cell; NaN where it rests on one day of one station.</summary>
    public (double Lower, double Upper) Interval(int cell, Votes votes, bool isShare)
    {
        var mean = votes.Mean(cell);
        var half = HalfWidth(cell, votes);
        if (double.IsNaN(half))
        {
            return (double.NaN, double.NaN);
        }

        return isShare ? OfShare(mean, half, looks[cell]) : (mean - half, mean + half);
    }

    /// <summary>Half a 95 % interval on the scale of the values.</summary>
    internal double HalfWidth(int cell, Votes votes)
    {
        var (_, days) = calendar ??= Calendar();
        var series = new double[days.Length];
        var (dates, values, betweenDays, inverse) = (0, 0, 0.0, 0.0);
        for (var d = 0; d < series.Length; d++)
        {
            var count = days[d]?.Count[cell] ?? 0;
            series[d] = count == 0 ? double.NaN : days[d]!.Value.Sum[cell] / count;
            if (count > 0)
            {
                dates++;
                values += count;
                betweenDays += count * series[d] * series[d];
                inverse += 1.0 / count;
            }
        }

        var restFreedom = values - stations[cell] - dates + 1;
        var rest = stations[cell] < 2 || restFreedom <= 0 ? 0 : Math.Max(0, (withinStations[cell] - betweenDays) / restFreedom);
        var (dayVariance, dayFreedom) = DaySeries.VarianceOfMean(series, dates == 0 ? 0 : rest * inverse / dates);
        var voters = votes.Count(cell);
        if (voters < 2)
        {
            return dates < 2 ? double.NaN : StudentT.HalfWidth95(dayFreedom) * Math.Sqrt(dayVariance);
        }

        var stationVariance = votes.Variance(cell) / voters;
        var (s, d2) = (StudentT.HalfWidth95(voters - 1), StudentT.HalfWidth95(dayFreedom));
        return Math.Sqrt((s * s * stationVariance) + (d2 * d2 * dayVariance));
    }

    private static (double Lower, double Upper) OfShare(double mean, double half, int looks)
    {
        var centre = ((mean * looks) + 0.5) / (looks + 1);
        var slope = centre * (1 - centre);
        var width = Math.Max(half, 1.96 * Math.Sqrt(slope / (looks + 1))) / slope;
        var logit = Math.Log(centre / (1 - centre));
        return (Math.Min(mean, Expit(logit - width)), Math.Max(mean, Expit(logit + width)));
    }

    private static double Expit(double x) => 1 / (1 + Math.Exp(-x));

    // Every date from the first to the last, so that neighbours in the series are neighbours in time.
    private (DateOnly First, (double[] Sum, int[] Count)?[] Days) Calendar()
    {
        if (byDate.Count == 0)
        {
            return (default, []);
        }

        var first = byDate.Keys.First();
        var days = new (double[], int[])?[byDate.Keys.Last().DayNumber - first.DayNumber + 1];
        foreach (var (date, sums) in byDate)
        {
            days[date.DayNumber - first.DayNumber] = sums;
        }

        return (first, days);
    }
}
