using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>Many day sheets as NDJSON: one JSON sheet a line.</summary>
public sealed class BulkJsonReader(SheetContext context) : IBulkReader
{
    private readonly PendingBytes pending = new();
    private readonly HashSet<DateOnly> dates = [];
    private int searched;
    private int count;
    private bool skipping;
    private bool first = true;

    /// <inheritdoc/>
    public IReadOnlyList<SheetProblem> HeaderProblems => [];

    /// <inheritdoc/>
    public bool HeaderRead => true;

    /// <inheritdoc/>
    public bool Stopped { get; private set; }

    /// <inheritdoc/>
    public void Feed(ReadOnlySpan<byte> chunk, ICollection<BulkDay> completed)
    {
        ArgumentNullException.ThrowIfNull(completed);
        if (Stopped)
        {
            return;
        }

        pending.Append(chunk);
        while (!Stopped)
        {
            var unread = pending.Unread;
            var end = unread[searched..].IndexOf((byte)'\n');
            if (end < 0)
            {
                searched = unread.Length;
                if (searched > BulkLimits.MaxDayBytes)
                {
                    DropTooLong(completed);
                }

                return;
            }

            end += searched;
            searched = 0;
            var line = unread[..end];
            if (!skipping)
            {
                Line(line.EndsWith("\r"u8) ? line[..^1] : line, completed);
            }

            skipping = false;
            pending.Skip(end + 1);
        }
    }

    /// <inheritdoc/>
    public void Finish(bool endedProperly, ICollection<BulkDay> completed)
    {
        ArgumentNullException.ThrowIfNull(completed);
        if (endedProperly && !Stopped && !skipping)
        {
            Line(pending.Unread, completed);
        }

        Stopped = true;
    }

    // A line that never ends is told once and its rest thrown away.
    private void DropTooLong(ICollection<BulkDay> completed)
    {
        if (!skipping)
        {
            Refuse(pending.Unread, completed, new(0, "", SheetRule.DayTooLarge, "The line is longer than 2 MB."));
        }

        skipping = true;
        pending.Skip(searched);
        searched = 0;
    }

    private void Line(ReadOnlySpan<byte> line, ICollection<BulkDay> completed)
    {
        var text = first ? CsvRecords.WithoutMark(line) : line;
        first = false;
        if (text.Trim((byte)' ').IsEmpty)
        {
            return;
        }

        if (text.Length > BulkLimits.MaxDayBytes)
        {
            Refuse(text, completed, new(0, "", SheetRule.DayTooLarge, "The line is longer than 2 MB."));
            return;
        }

        if (!DaySheetJson.TryDate(text, out var told, out var problem))
        {
            Refuse(text, completed, problem);
            return;
        }

        if (told is null || !DateText.TryParse(told, out var date))
        {
            Refuse(text, completed, new(0, "date", SheetRule.DateSyntax, told is null ? "The sheet has no date." : "The date is not yyyy-MM-dd."));
            return;
        }

        var builder = new SheetBuilder(context, SheetFields.Json, date, 0);
        if (!dates.Add(date))
        {
            builder.Add(0, "date", SheetRule.DateAgain, "The date came earlier in this body; send each day once.");
        }

        Give(new(DateText.Format(date), date, DaySheetJson.ReadCells(text, builder), text.Length), completed);
    }

    private void Refuse(ReadOnlySpan<byte> text, ICollection<BulkDay> completed, SheetProblem problem) =>
        Give(new(BulkLimits.Shown(text), null, new(null, [problem], []), text.Length), completed);

    private void Give(BulkDay day, ICollection<BulkDay> completed)
    {
        if (++count > BulkLimits.MaxDays)
        {
            day = day with { Reading = new(null, [new(0, "", SheetRule.TooManyDays, "A body holds at most 4000 days; the rest was not read.")], []) };
            Stopped = true;
        }

        completed.Add(day);
    }
}
