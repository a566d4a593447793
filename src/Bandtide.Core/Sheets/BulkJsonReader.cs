using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>Many day sheets as NDJSON: one JSON sheet a line. Empty lines are passed over.</summary>
public sealed class BulkJsonReader(SheetContext context) : IBulkReader
{
    private const int PieceBytes = 64 * 1024;

    private readonly PendingBytes pending = new();
    private readonly BulkDates dates = new();
    private int searched;
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
        while (!chunk.IsEmpty && !Stopped)
        {
            var piece = chunk[..Math.Min(chunk.Length, PieceBytes)];
            chunk = chunk[piece.Length..];
            pending.Append(piece);
            ReadLines(completed);
        }
    }

    /// <inheritdoc/>
    public void Finish(bool endedProperly, ICollection<BulkDay> completed)
    {
        ArgumentNullException.ThrowIfNull(completed);
        if (!Stopped && !skipping)
        {
            if (endedProperly)
            {
                ReadLine(pending.Unread, completed);
            }
            else if (!pending.Unread.IsEmpty)
            {
                completed.Add(Refused(pending.Unread, pending.Unread, SheetRule.BodyIncomplete, "", BulkLimits.Incomplete));
            }
        }

        Stopped = true;
    }

    private void ReadLines(ICollection<BulkDay> completed)
    {
        while (!Stopped)
        {
            var unread = pending.Unread;
            var end = unread[searched..].IndexOf((byte)'\n');
            if (end < 0)
            {
                searched = unread.Length;
                DropTooLong(completed);
                return;
            }

            end += searched;
            searched = 0;
            if (!skipping)
            {
                ReadLine(unread[..end], completed);
            }

            skipping = false;
            pending.Skip(end + 1);
        }
    }

    // A line that never ends is told once and its rest thrown away.
    private void DropTooLong(ICollection<BulkDay> completed)
    {
        if (searched <= BulkLimits.MaxDayBytes)
        {
            return;
        }

        if (!skipping)
        {
            ReadLine(pending.Unread, completed);
        }

        skipping = true;
        pending.Skip(searched);
        searched = 0;
    }

    private void ReadLine(ReadOnlySpan<byte> line, ICollection<BulkDay> completed)
    {
        var text = first ? line[Utf8Mark.LengthIn(line)..] : line;
        first = false;
        if (text.Trim(" \t\r"u8).IsEmpty)
        {
            return;
        }

        completed.Add(text.Length > BulkLimits.MaxDayBytes
            ? Refused(text, text, SheetRule.DayTooLarge, "", "The line is longer than 2 MB.")
            : ReadSheet(text));
        Stopped = dates.AreTooMany;
    }

    private BulkDay ReadSheet(ReadOnlySpan<byte> text)
    {
        if (!JsonSheet.TryFindDate(text, out var told, out var reason))
        {
            return Refused(text, text, SheetRule.JsonSyntax, "", reason);
        }

        if (told is null || !DateText.TryParse(told, out var date))
        {
            return told is null
                ? Refused(text, text, SheetRule.DateSyntax, "date", "The sheet has no date, yyyy-MM-dd.")
                : Refused(text, System.Text.Encoding.UTF8.GetBytes(told), SheetRule.DateSyntax, "date", "The date is not yyyy-MM-dd.");
        }

        var builder = new SheetBuilder(context, SheetFields.Json, date, 0);
        var reading = JsonSheet.Read(text, builder, out var isJson);
        if (!isJson)
        {
            return Refused(text, text, SheetRule.JsonSyntax, "", reading.Problems[^1].Message);
        }

        // Only what could be read counts as the date's coming.
        var problems = new ProblemList();
        dates.Judge(problems, 0, date);
        return new(DateText.Format(date), date, problems.Count > 0 ? new(null, [.. problems.Items, .. reading.Problems.Take(ProblemList.Max - 1)], reading.Warnings) : reading, text.Length);
    }

    private BulkDay Refused(ReadOnlySpan<byte> text, ReadOnlySpan<byte> shown, string rule, string field, string message)
    {
        var problems = new ProblemList();
        dates.Judge(problems, 0, null);
        problems.Add(0, field, rule, message);
        return new(ShownText.Cut(shown, BulkLimits.MaxShownBytes), null, new(null, problems.Items, []), text.Length);
    }
}
