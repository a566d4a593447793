using Bandtide.Core.Statistics;
using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>Reads the planes of all dates cell by cell, in order of time.</summary>
internal sealed class DateTable
{
    private readonly (int Day, int Month, DatePlanes Planes)[] dates;
    private readonly int[] days;
    private readonly int[] months;
    private readonly float[] weights;
    private readonly float[] counts;
    private readonly float[] deviations;

    public DateTable(Dictionary<int, DatePlanes> planesByDay)
    {
        dates = [.. planesByDay.OrderBy(date => date.Key)
            .Select(date => (date.Key, YearMonth.Of(DateOnly.FromDayNumber(date.Key)).Number, date.Value))];
        (days, months) = (new int[dates.Length], new int[dates.Length]);
        (weights, counts, deviations) = (new float[dates.Length], new float[dates.Length], new float[dates.Length]);
    }

    /// <summary>The dates that a cell rests on. Valid until the next call.</summary>
    public DaySpans Read(int cell)
    {
        var count = 0;
        foreach (var (day, month, planes) in dates)
        {
            var weight = planes.Weights[cell] + planes.FullWeight;
            if (weight > 0)
            {
                var stations = planes.Counts[cell] + planes.FullCount;
                (days[count], months[count], weights[count], counts[count]) = (day, month, weight, stations);
                deviations[count] = stations > 0 ? planes.Deviations[cell] / stations : float.NaN;
                count++;
            }
        }

        return new()
        {
            Days = days.AsSpan(0, count),
            Months = months.AsSpan(0, count),
            Weights = weights.AsSpan(0, count),
            Counts = counts.AsSpan(0, count),
            Deviations = deviations.AsSpan(0, count),
        };
    }
}
