using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>The day that a CSV body of many is being read.</summary>
internal sealed class BulkCsvDay
{
    private readonly byte[] text;
    private readonly DateOnly? date;
    private int bytes;
    private bool isTooLarge;

    /// <param name="context">Plan and moment of judgement.</param>
    /// <param name="dates">The dates of the body so far.</param>
    /// <param name="dateText">The date as written.</param>
    /// <param name="line">Line of its first row.</param>
    public BulkCsvDay(SheetContext context, BulkDates dates, ReadOnlySpan<byte> dateText, int line)
    {
        text = dateText.ToArray();
        date = DateText.TryParse(dateText, out var read) ? read : null;
        Builder = new(context, SheetFields.Csv, date, line);
        dates.Judge(Problems, line, date);
        if (date is null)
        {
            Problems.Add(line, "date", SheetRule.DateSyntax, $"{ShownText.Quote(dateText)} is not a date, yyyy-MM-dd.");
        }
    }

    /// <summary>The date as written.</summary>
    public ReadOnlySpan<byte> Text => text;

    public SheetBuilder Builder { get; }

    public ProblemList Problems => Builder.Problems;

    /// <summary>Counts the bytes of a row; false, told once, when they are too many for a day.</summary>
    public bool MayTake(int rowBytes, int line)
    {
        bytes = (int)Math.Min((long)bytes + rowBytes, int.MaxValue);
        if (bytes > BulkLimits.MaxDayBytes && !isTooLarge)
        {
            isTooLarge = true;
            Problems.Add(line, "", SheetRule.DayTooLarge, "The day's text is longer than 2 MB.");
        }

        return !isTooLarge;
    }

    public BulkDay Build(IReadOnlyList<SheetWarning> warnings) =>
        new(ShownText.Cut(text, BulkLimits.MaxShownBytes), date, Builder.Build(warnings), bytes);
}
