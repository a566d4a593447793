namespace Bandtide.Core.Sheets;

/// <summary>The days that one body has held so far.</summary>
internal sealed class BulkDates
{
    private readonly HashSet<DateOnly> dates = [];
    private int days;

    /// <summary>Whether the last day was one too many.</summary>
    public bool AreTooMany => days > BulkLimits.MaxDays;

    /// <summary>Counts a day, and refuses one too many or one that came before.</summary>
    /// <param name="problems">Its problems.</param>
    /// <param name="line">Its line.</param>
    /// <param name="date">Its date, or <c>null</c> when that cannot be read.</param>
    public void Judge(ProblemList problems, int line, DateOnly? date)
    {
        days++;
        if (AreTooMany)
        {
            problems.Add(line, "", SheetRule.TooManyDays, $"A body holds at most {BulkLimits.MaxDays} days; this one and the rest were not read.");
        }
        else if (date is { } day && !dates.Add(day))
        {
            problems.Add(line, "date", SheetRule.DateAgain, "The date came earlier in this body; what belongs to a day must stand together.");
        }
    }
}
