namespace Bandtide.Core.Sheets;

/// <summary>Finds the end of CSV records: a line end outside quotes.</summary>
internal static class CsvRecords
{
    private static readonly byte[] Mark = [0xEF, 0xBB, 0xBF];

    /// <summary>Drops a byte order mark.</summary>
    public static ReadOnlySpan<byte> WithoutMark(ReadOnlySpan<byte> body) => body.StartsWith(Mark) ? body[Mark.Length..] : body;

    /// <summary>Length of the first record without its line end, or -1 when the text ends inside it.</summary>
    /// <param name="text">Text that begins at a record.</param>
    /// <param name="lines">Lines that the record takes: more than one when a quoted field holds line ends.</param>
    /// <param name="next">Where the next record begins.</param>
    /// <param name="openQuote">Whether the text ends inside a quoted field.</param>
    public static int Find(ReadOnlySpan<byte> text, out int lines, out int next, out bool openQuote)
    {
        (lines, next, openQuote) = (1, 0, false);
        var end = text.IndexOfAny((byte)'\n', (byte)'"');
        while (end >= 0)
        {
            if (text[end] == '\n')
            {
                if (!openQuote)
                {
                    next = end + 1;
                    return end > 0 && text[end - 1] == '\r' ? end - 1 : end;
                }

                lines++;
            }
            else
            {
                openQuote = !openQuote;
            }

            var more = text[(end + 1)..].IndexOfAny((byte)'\n', (byte)'"');
            end = more < 0 ? -1 : end + 1 + more;
        }

        return -1;
    }
}
