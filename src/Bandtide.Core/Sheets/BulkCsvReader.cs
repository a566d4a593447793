using System.Text.Unicode;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>Many day sheets as one CSV body with a <c>date</c> column: consecutive rows of the same date text are one day.</summary>
public sealed class BulkCsvReader(SheetContext context) : IBulkReader
{
    private readonly PendingBytes pending = new();
    private readonly CsvRow row = new();
    private readonly List<SheetProblem> headerProblems = [];
    private readonly HashSet<DateOnly> dates = [];
    private CsvHeader? header;
    private IReadOnlyList<SheetWarning> warnings = [];
    private int line = 1;
    private int count;
    private bool skipping;
    private bool first = true;

    // The day being read.
    private byte[]? dayText;
    private DateOnly? date;
    private SheetBuilder? day;
    private int dayBytes;

    /// <inheritdoc/>
    public IReadOnlyList<SheetProblem> HeaderProblems => headerProblems;

    /// <inheritdoc/>
    public bool HeaderRead => header is not null || headerProblems.Count > 0;

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
        if (first && pending.Unread.Length >= 3)
        {
            pending.Skip(pending.Unread.Length - CsvRecords.WithoutMark(pending.Unread).Length);
            first = false;
        }

        while (!Stopped && !first)
        {
            var unread = pending.Unread;
            var length = CsvRecords.Find(unread, out var lines, out var next, out _);
            if (length < 0)
            {
                if (unread.Length > BulkLimits.MaxDayBytes)
                {
                    DropTooLong(completed);
                }

                return;
            }

            Record(unread[..length], lines, completed);
            pending.Skip(next);
        }
    }

    /// <inheritdoc/>
    public void Finish(bool endedProperly, ICollection<BulkDay> completed)
    {
        ArgumentNullException.ThrowIfNull(completed);
        if (Stopped)
        {
            return;
        }

        if (!endedProperly)
        {
            Stopped = true;
            return;
        }

        var rest = first ? CsvRecords.WithoutMark(pending.Unread) : pending.Unread;
        var length = CsvRecords.Find(rest, out var lines, out var next, out var openQuote);
        if (length >= 0)
        {
            Record(rest[..length], lines, completed);
            rest = rest[next..];
            CsvRecords.Find(rest, out lines, out _, out openQuote);
        }

        if (openQuote)
        {
            UnclosedQuote(rest, completed);
        }
        else if (!rest.IsEmpty && !Stopped)
        {
            Record(rest, lines, completed);
        }

        if (header is null && headerProblems.Count == 0)
        {
            headerProblems.Add(new(1, "", SheetRule.HeaderMissing, "The body is empty; it must begin with a header line."));
        }

        EndDay(completed);
        Stopped = true;
    }

    private void Record(ReadOnlySpan<byte> record, int lines, ICollection<BulkDay> completed)
    {
        if (skipping)
        {
            skipping = false;
        }
        else if (!record.IsEmpty)
        {
            Row(record, completed);
        }

        line += lines;
    }

    private void Row(ReadOnlySpan<byte> record, ICollection<BulkDay> completed)
    {
        var valid = Utf8.IsValid(record);
        var split = row.Split(record, out var text);
        if (header is null)
        {
            ReadHeader(valid && split, text);
            return;
        }

        // A row that cannot be split still tells which day it belongs to, if its date can be found at all.
        var place = header.Date < row.Count ? row.Fields[header.Date] : FieldSlice.Absent;
        var dateText = place.Of(split ? text : record);
        if (dayText is null || !dateText.SequenceEqual(dayText))
        {
            if (!split && day is not null)
            {
                day.Add(line, "", SheetRule.QuoteSyntax, "A quote stands where RFC 4180 allows none.");
                return;
            }

            EndDay(completed);
            if (Stopped || !BeginDay(dateText, completed))
            {
                return;
            }
        }

        dayBytes += record.Length + 1;
        if (dayBytes > BulkLimits.MaxDayBytes)
        {
            day!.Add(line, "", SheetRule.DayTooLarge, "The day's text is longer than 2 MB.");
            return;
        }

        if (!valid)
        {
            day!.Add(line, "", SheetRule.Utf8, "The line is not UTF-8.");
        }
        else if (!split)
        {
            day!.Add(line, "", SheetRule.QuoteSyntax, "A quote stands where RFC 4180 allows none.");
        }
        else if (row.Count != header.Columns)
        {
            day!.Add(line, "", SheetRule.FieldCount, $"The line has {row.Count} fields, the header {header.Columns}.");
        }
        else
        {
            Span<FieldSlice> byField = stackalloc FieldSlice[SheetFields.Count];
            header.Sort(row.Fields, byField);
            day!.AddCell(line, text, byField);
        }
    }

    private void ReadHeader(bool readable, ReadOnlySpan<byte> text)
    {
        if (readable)
        {
            header = CsvHeader.Read(row.Fields, text, needsDate: true, headerProblems);
        }
        else
        {
            headerProblems.Add(new(1, "", SheetRule.HeaderMissing, "The first line is not a CSV header in UTF-8."));
        }

        Stopped = header is null;
        warnings = header?.Warnings() ?? [];
    }

    private bool BeginDay(ReadOnlySpan<byte> text, ICollection<BulkDay> completed)
    {
        dayText = text.ToArray();
        dayBytes = 0;
        if (++count > BulkLimits.MaxDays)
        {
            Give(new(null, [new(line, "", SheetRule.TooManyDays, "A body holds at most 4000 days; the rest was not read.")], []), completed);
            Stopped = true;
            return false;
        }

        date = DateText.TryParse(text, out var read) ? read : null;
        day = new(context, SheetFields.Csv, date, line);
        if (date is null)
        {
            day.Add(line, "date", SheetRule.DateSyntax, $"{SheetBuilder.Quote(text)} is not a date, yyyy-MM-dd.");
        }
        else if (!dates.Add(date.Value))
        {
            day.Add(line, "date", SheetRule.DateAgain, "The date came earlier in this body; its rows must stand together.");
        }

        return true;
    }

    private void EndDay(ICollection<BulkDay> completed)
    {
        if (day is not null)
        {
            Give(day.Build(warnings), completed);
        }

        (day, dayText, date) = (null, null, null);
    }

    private void Give(SheetReading reading, ICollection<BulkDay> completed) =>
        completed.Add(new(BulkLimits.Shown(dayText), date, reading, dayBytes));

    private void UnclosedQuote(ReadOnlySpan<byte> rest, ICollection<BulkDay> completed)
    {
        if (header is null)
        {
            headerProblems.Add(new(1, "", SheetRule.QuoteUnclosed, "A quote opened in the header is never closed."));
            return;
        }

        // The date of the broken row decides whether it belongs to the day being read.
        row.Split(rest[..rest.IndexOf((byte)'"')], out var text);
        var place = header.Date < row.Count ? row.Fields[header.Date] : FieldSlice.Absent;
        if (place.Length > 0 && (dayText is null || !place.Of(text).SequenceEqual(dayText)))
        {
            EndDay(completed);
            BeginDay(place.Of(text), completed);
        }
        else if (day is null)
        {
            BeginDay(BulkLimits.Shown(rest) is var shown ? System.Text.Encoding.UTF8.GetBytes(shown) : default, completed);
        }

        day?.Add(line, "", SheetRule.QuoteUnclosed, "A quote opened on this line is never closed; nothing after it was read.");
    }

    private void DropTooLong(ICollection<BulkDay> completed)
    {
        if (header is null)
        {
            headerProblems.Add(new(1, "", SheetRule.HeaderMissing, "The first line is longer than 2 MB."));
            Stopped = true;
            return;
        }

        CsvRecords.Find(pending.Unread, out _, out _, out var openQuote);
        if (openQuote)
        {
            UnclosedQuote(pending.Unread, completed);
            EndDay(completed);
            Stopped = true;
            return;
        }

        if (!skipping)
        {
            if (day is null)
            {
                BeginDay(pending.Unread[..BulkLimits.MaxShownText], completed);
            }

            day?.Add(line, "", SheetRule.DayTooLarge, "The line is longer than 2 MB.");
        }

        skipping = true;
        pending.Skip(pending.Unread.Length);
    }
}
