namespace Bandtide.Core.Statistics;

/// <summary>The days that a mean rests on, in order of time. All spans are equally long.</summary>
internal readonly ref struct DaySpans
{
    /// <summary>Day numbers, ascending.</summary>
    public required ReadOnlySpan<int> Days { get; init; }

    /// <summary>A number for the month of each day.</summary>
    public required ReadOnlySpan<int> Months { get; init; }

    /// <summary>Weight of each day in the mean, above 0, any scale.</summary>
    public required ReadOnlySpan<float> Weights { get; init; }

    /// <summary>Number of stations behind each deviation; 0 where there is none.</summary>
    public required ReadOnlySpan<float> Counts { get; init; }

    /// <summary>Mean deviation of each day from the mean of its month; NaN where there is none.</summary>
    public required ReadOnlySpan<float> Deviations { get; init; }

    /// <summary>The days from one place up to but not including another.</summary>
    public DaySpans this[Range range] => new()
    {
        Days = Days[range],
        Months = Months[range],
        Weights = Weights[range],
        Counts = Counts[range],
        Deviations = Deviations[range],
    };

    /// <summary>The place after the last day of the month that begins at a place.</summary>
    public int EndOfMonth(int start)
    {
        var end = start + 1;
        while (end < Months.Length && Months[end] == Months[start])
        {
            end++;
        }

        return end;
    }
}
