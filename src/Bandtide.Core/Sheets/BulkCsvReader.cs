using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>Many day sheets as one CSV body with a <c>date</c> column: consecutive rows of the same date text are one day.</summary>
/// <remarks>
/// A row whose quotes or number of fields are wrong is split at its commas all the same, to find its date: it refuses its own
/// day and no other. One that has no field for the date belongs to the day being read, lest that is kept without one of its rows.
/// Empty lines are passed over.
/// </remarks>
public sealed class BulkCsvReader(SheetContext context) : IBulkReader
{
    private const int PieceBytes = 64 * 1024;

    private readonly PendingBytes pending = new();
    private readonly CsvRecordFinder records = new();
    private readonly CsvRow row = new();
    private readonly ProblemList headerProblems = new();
    private readonly BulkDates dates = new();
    private CsvHeader? header;
    private IReadOnlyList<SheetWarning> warnings = [];
    private BulkCsvDay? day;
    private int line = 1;
    private bool skipping;
    private bool first = true;

    /// <inheritdoc/>
    public IReadOnlyList<SheetProblem> HeaderProblems => headerProblems.Items;

    /// <inheritdoc/>
    public bool HeaderRead => header is not null || headerProblems.Count > 0;

    /// <inheritdoc/>
    public bool Stopped { get; private set; }

    /// <inheritdoc/>
    public void Feed(ReadOnlySpan<byte> chunk, ICollection<BulkDay> completed)
    {
        ArgumentNullException.ThrowIfNull(completed);
        while (!chunk.IsEmpty && !Stopped)
        {
            // In pieces, so that what is kept does not grow with the chunk.
            var piece = chunk[..Math.Min(chunk.Length, PieceBytes)];
            chunk = chunk[piece.Length..];
            pending.Append(piece);
            if (!first || pending.Unread.Length >= Utf8Mark.Length)
            {
                ReadRecords(completed);
            }
        }
    }

    /// <inheritdoc/>
    public void Finish(bool endedProperly, ICollection<BulkDay> completed)
    {
        ArgumentNullException.ThrowIfNull(completed);
        if (!Stopped && endedProperly)
        {
            ReadRecords(completed);
            var rest = CsvRecordFinder.WithoutReturn(pending.Unread);
            if (!Stopped && !rest.IsEmpty)
            {
                ReadRow(rest, isOpen: records.InsideQuotes, completed);
            }

            if (!HeaderRead)
            {
                headerProblems.Add(line, "", SheetRule.HeaderMissing, "The body is empty; it must begin with a header line.");
            }

            if (!Stopped)
            {
                EndDay(completed);
            }
        }
        else if (!Stopped && day is not null)
        {
            day.Problems.Add(line, "", SheetRule.BodyIncomplete, BulkLimits.Incomplete);
            EndDay(completed);
        }

        Stopped = true;
    }

    private void ReadRecords(ICollection<BulkDay> completed)
    {
        if (first)
        {
            first = false;
            pending.Skip(Utf8Mark.LengthIn(pending.Unread));
        }

        while (!Stopped && (!skipping || SkipLine()))
        {
            var unread = pending.Unread;
            var length = records.Find(unread, out var next);
            if (length < 0)
            {
                if (unread.Length > BulkLimits.MaxDayBytes)
                {
                    DropTooLong(completed);
                }

                return;
            }

            if (length > 0)
            {
                ReadRow(unread[..length], isOpen: false, completed);
            }

            line += 1 + records.InnerLines;
            records.Reset();
            pending.Skip(next);
        }
    }

    // A record that holds the end of an open quote, or one that closes lines later in the wrong place, cannot be trusted
    // about where it ends: reading stops there.
    private void ReadRow(ReadOnlySpan<byte> record, bool isOpen, ICollection<BulkDay> completed)
    {
        row.Split(record, out var text);
        var isUnclosed = isOpen || (!row.IsWellFormed && records.InnerLines > 0);
        if (isUnclosed)
        {
            row.SplitAtCommas(record);
            text = record;
        }

        if (header is null)
        {
            ReadHeader(text, isUnclosed);
        }
        else if (EnterDay(record, text, completed))
        {
            if (isUnclosed)
            {
                day!.Problems.Add(line, "", SheetRule.QuoteUnclosed, "A quote opened on this line is not closed on it; nothing after it was read.");
                EndDay(completed);
                Stopped = true;
            }
            else if (day!.MayTake(record.Length + 1, line))
            {
                header.AddRow(day.Builder, line, row, text);
            }
        }
    }

    private void ReadHeader(ReadOnlySpan<byte> text, bool isUnclosed)
    {
        if (isUnclosed)
        {
            headerProblems.Add(line, "", SheetRule.QuoteUnclosed, "A quote opened in the header is not closed in it.");
        }
        else
        {
            header = CsvHeader.Read(line, row, text, needsDate: true, headerProblems);
        }

        Stopped = header is null;
        warnings = header?.Warnings() ?? [];
    }

    // Goes on with the day being read or begins the next. False when that is one too many.
    private bool EnterDay(ReadOnlySpan<byte> record, ReadOnlySpan<byte> text, ICollection<BulkDay> completed)
    {
        var hasDate = TryFindDate(text, out var dateText);
        if (day is not null && (!hasDate || dateText.SequenceEqual(day.Text)))
        {
            return true;
        }

        EndDay(completed);
        day = new(context, dates, hasDate ? dateText : record, line);
        Stopped = dates.AreTooMany;
        if (Stopped)
        {
            EndDay(completed);
        }

        return !Stopped;
    }

    // The date stands where the header says, or where that is counted from the end in a row of too few or too many fields.
    private bool TryFindDate(ReadOnlySpan<byte> text, out ReadOnlySpan<byte> date)
    {
        date = FieldAt(header!.Date, text);
        var other = FieldAt(header.Date + row.Count - header.Columns, text);
        if (row.Count != header.Columns && !DateText.TryParse(date, out _) && DateText.TryParse(other, out _))
        {
            date = other;
            return true;
        }

        return header.Date < row.Count;
    }

    private ReadOnlySpan<byte> FieldAt(int column, ReadOnlySpan<byte> text)
    {
        var field = column < 0 || column >= row.Count ? default : row.Fields[column].Of(text);
        return row.IsWellFormed ? field : field.Trim((byte)'"');
    }

    private void EndDay(ICollection<BulkDay> completed)
    {
        if (day is not null)
        {
            completed.Add(day.Build(warnings));
            day = null;
        }
    }

    // The rest of a line that is too long to keep.
    private void DropTooLong(ICollection<BulkDay> completed)
    {
        if (records.InsideQuotes)
        {
            ReadRow(pending.Unread, isOpen: true, completed);
            return;
        }

        if (header is null)
        {
            headerProblems.Add(line, "", SheetRule.HeaderMissing, "The first line is longer than 2 MB.");
            Stopped = true;
            return;
        }

        row.Split(pending.Unread, out var text);
        if (EnterDay(pending.Unread, text, completed))
        {
            day!.MayTake(pending.Unread.Length, line);
            skipping = true;
            pending.Skip(pending.Unread.Length);
        }
    }

    private bool SkipLine()
    {
        var end = pending.Unread.IndexOf((byte)'\n');
        pending.Skip(end < 0 ? pending.Unread.Length : end + 1);
        if (end >= 0)
        {
            skipping = false;
            line += 1 + records.InnerLines;
            records.Reset();
        }

        return !skipping;
    }
}
