namespace Bandtide.Core.Sheets;

/// <summary>Finds the ends of CSV records: line ends outside quotes. Goes on where it stopped when more text arrives.</summary>
/// <remarks>
/// A quote opens a field only at its beginning, as RFC 4180 has it; a stray one inside a field is left to whoever splits the
/// record, so that it spoils one line and not all that follow.
/// </remarks>
internal sealed class CsvRecordFinder
{
    private int searched;
    private bool quoted;
    private bool quotePending;

    /// <summary>Whether the text searched so far ends inside a quoted field.</summary>
    public bool InsideQuotes => quoted && !quotePending;

    /// <summary>Line ends inside the record so far: more than none when a quoted field holds some.</summary>
    public int InnerLines { get; private set; }

    /// <summary>Finds the end of the record that a text begins with.</summary>
    /// <param name="text">The same beginning as in the last call, if that found nothing, and what has arrived since.</param>
    /// <param name="next">Where the next record begins.</param>
    /// <returns>Length of the record without its line end, or -1 when the text ends inside it.</returns>
    public int Find(ReadOnlySpan<byte> text, out int next)
    {
        while (searched < text.Length)
        {
            if (quoted)
            {
                Quoted(text);
                continue;
            }

            var found = text[searched..].IndexOfAny((byte)'\n', (byte)'"');
            if (found < 0)
            {
                searched = text.Length;
                break;
            }

            var at = searched + found;
            searched = at + 1;
            if (text[at] == '\n')
            {
                next = at + 1;
                return WithoutReturn(text[..at]).Length;
            }

            quoted = at == 0 || text[at - 1] == ',';
        }

        next = 0;
        return -1;
    }

    /// <summary>A record without the carriage return that belongs to its line end.</summary>
    public static ReadOnlySpan<byte> WithoutReturn(ReadOnlySpan<byte> record) => record.EndsWith("\r"u8) ? record[..^1] : record;

    /// <summary>Begins a new record.</summary>
    public void Reset() => (searched, quoted, quotePending, InnerLines) = (0, false, false, 0);

    // One step inside a quoted field: two quotes together are one that belongs to the value.
    private void Quoted(ReadOnlySpan<byte> text)
    {
        if (quotePending)
        {
            quotePending = false;
            quoted = text[searched] == '"';
            searched += quoted ? 1 : 0;
            return;
        }

        var found = text[searched..].IndexOfAny((byte)'\n', (byte)'"');
        if (found < 0)
        {
            searched = text.Length;
            return;
        }

        quotePending = text[searched + found] == '"';
        InnerLines += quotePending ? 0 : 1;
        searched += found + 1;
    }
}
