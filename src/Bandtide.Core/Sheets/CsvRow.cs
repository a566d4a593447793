using System.Numerics;
using System.Runtime.Intrinsics;
using System.Text.Unicode;

namespace Bandtide.Core.Sheets;

/// <summary>Splits one CSV record of RFC 4180 into its fields. Reused from row to row.</summary>
internal sealed class CsvRow
{
    private FieldSlice[] fields = new FieldSlice[16];
    private byte[] unquoted = [];

    /// <summary>The fields, valid until the next row.</summary>
    public ReadOnlySpan<FieldSlice> Fields => fields.AsSpan(0, Count);

    /// <summary>Number of fields.</summary>
    public int Count { get; private set; }

    /// <summary>False when a quote stands inside a field that is not quoted, text follows a closing quote, or none closes.</summary>
    public bool IsWellFormed { get; private set; }

    /// <summary>Whether the record is UTF-8.</summary>
    public bool IsUtf8 { get; private set; }

    /// <summary>Splits a record. One that is not well formed is split at its commas as far as possible.</summary>
    /// <param name="record">Without its line end.</param>
    /// <param name="text">What the slices point into: the record, or a copy without quotes.</param>
    public void Split(ReadOnlySpan<byte> record, out ReadOnlySpan<byte> text)
    {
        (Count, IsWellFormed, IsUtf8) = (0, true, true);
        text = record;
        if (!SplitPlain(record))
        {
            Count = 0;
            SplitQuoted(record, out text);
        }
    }

    /// <summary>Splits a record whose quotes cannot be made sense of: at every comma of its first line, quotes left in.</summary>
    /// <param name="record">The record, which the slices point into.</param>
    public void SplitAtCommas(ReadOnlySpan<byte> record)
    {
        (Count, IsWellFormed, IsUtf8) = (0, false, Utf8.IsValid(record));
        var end = record.IndexOf((byte)'\n');
        var line = CsvRecordFinder.WithoutReturn(end < 0 ? record : record[..end]);
        foreach (var field in line.Split((byte)','))
        {
            Add(new(field.Start.Value, field.End.Value - field.Start.Value));
        }
    }

    // False at a quote. Commas are found for 32 bytes at a time, and bytes beyond ASCII on the way.
    private bool SplitPlain(ReadOnlySpan<byte> record)
    {
        var (start, at) = (0, 0);
        var beyond = Vector256<byte>.Zero;
        for (; at + Vector256<byte>.Count <= record.Length; at += Vector256<byte>.Count)
        {
            var bytes = Vector256.Create(record[at..]);
            if (Vector256.EqualsAny(bytes, Vector256.Create((byte)'"')))
            {
                return false;
            }

            beyond |= bytes;
            var commas = Vector256.Equals(bytes, Vector256.Create((byte)',')).ExtractMostSignificantBits();
            for (; commas != 0; commas &= commas - 1)
            {
                var comma = at + BitOperations.TrailingZeroCount(commas);
                Add(new(start, comma - start));
                start = comma + 1;
            }
        }

        var ascii = beyond.ExtractMostSignificantBits() == 0;
        for (; at < record.Length; at++)
        {
            var value = record[at];
            if (value == ',')
            {
                Add(new(start, at - start));
                start = at + 1;
            }
            else if (value == '"')
            {
                return false;
            }

            ascii &= value < 0x80;
        }

        Add(new(start, record.Length - start));
        IsUtf8 = ascii || Utf8.IsValid(record);
        return true;
    }

    private void SplitQuoted(ReadOnlySpan<byte> record, out ReadOnlySpan<byte> text)
    {
        IsUtf8 = Utf8.IsValid(record);
        if (unquoted.Length < record.Length)
        {
            unquoted = new byte[record.Length];
        }

        var (at, length) = (0, 0);
        while (true)
        {
            var start = length;
            if (at < record.Length && record[at] == '"')
            {
                at = Unquote(record, at + 1, ref length);
            }

            for (; at < record.Length && record[at] != ','; at++)
            {
                // A quote inside a field that is not quoted, or something behind a closing one.
                IsWellFormed &= record[at] != '"' && (at == 0 || record[at - 1] != '"');
                unquoted[length++] = record[at];
            }

            Add(new(start, length - start));
            if (at >= record.Length)
            {
                text = unquoted.AsSpan(0, length);
                return;
            }

            at++;
        }
    }

    // Copies a quoted field and returns the place behind its closing quote.
    private int Unquote(ReadOnlySpan<byte> record, int at, ref int length)
    {
        while (at < record.Length)
        {
            if (record[at] != '"')
            {
                unquoted[length++] = record[at++];
            }
            else if (at + 1 < record.Length && record[at + 1] == '"')
            {
                unquoted[length++] = (byte)'"';
                at += 2;
            }
            else
            {
                return at + 1;
            }
        }

        IsWellFormed = false;
        return at;
    }

    private void Add(FieldSlice field)
    {
        if (Count == fields.Length)
        {
            Array.Resize(ref fields, fields.Length * 2);
        }

        fields[Count++] = field;
    }
}
