using System.Text;
using Bandtide.Core.Sheets;
using CsCheck;
using nietras.SeparatedValues;

namespace Bandtide.Core.Tests.Sheets;

public sealed class CsvSplittingTests
{
    private static readonly Gen<string> Field = SheetSamples.OneOf("", "0", "bc-49m", "-78.60", ",", "\"", "\"\"", "\n", "\r\n", "é", "µV", " ", "a,b", "x\"y")
        .Array[0, 4].Select(string.Concat);

    private static readonly Gen<(string Value, bool Quoted)[][]> Table =
        from columns in Gen.Int[1, 12]
        from rows in Gen.Select(Field, Gen.Bool).Array[columns].Array[1, 6]
        select rows;

    // Reference: the Sep library, which reads RFC 4180 with quotes undone. The text is written by RFC 4180, section 2:
    // a field with a comma, quote or line end is quoted, any other may be, and a quote inside is doubled.
    [Fact]
    public void Records_are_split_as_a_reference_library_splits_them() => Gen.Select(Table, Gen.Bool).Sample((table, crlf) =>
    {
        var text = string.Concat(table.Select(row => string.Join(',', row.Select(Written)) + (crlf ? "\r\n" : "\n")));
        using var reference = Sep.New(',').Reader(o => o with { HasHeader = false, Unescape = true, DisableColCountCheck = true }).FromText(text);
        var expected = new List<string[]>();
        foreach (var row in reference)
        {
            var fields = new string[row.ColCount];
            for (var c = 0; c < fields.Length; c++)
            {
                fields[c] = row[c].ToString();
            }

            expected.Add(fields);
        }

        Assert.Equal(table.Length, expected.Count);
        Assert.Equal(expected, Split(Encoding.UTF8.GetBytes(text), int.MaxValue, out var lines));
        Assert.Equal(text.Count(c => c == '\n'), lines);
    });

    [Fact]
    public void A_record_that_arrives_in_pieces_is_found_all_the_same() => Gen.Select(Table, Gen.Int[1, 5]).Sample((table, piece) =>
    {
        var text = Encoding.UTF8.GetBytes(string.Concat(table.Select(row => string.Join(',', row.Select(Written)) + "\n")));
        Assert.Equal(Split(text, int.MaxValue, out var lines), Split(text, piece, out var linesInPieces));
        Assert.Equal(lines, linesInPieces);
    });

    [Theory]
    [InlineData("a,b\"c,d", "a|b\"c|d")]
    [InlineData("a,\"b\"c,d", "a|bc|d")]
    [InlineData("a,\"b", "a|b")]
    [InlineData("\"a\" ,b", "a |b")]
    public void Quotes_in_wrong_places_are_told_and_the_other_fields_found(string record, string fields)
    {
        var row = new CsvRow();
        row.Split(Encoding.UTF8.GetBytes(record), out var text);
        Assert.False(row.IsWellFormed);
        Assert.Equal(fields, string.Join('|', Fields(row, text)));
    }

    [Fact]
    public void A_stray_quote_inside_a_field_does_not_join_lines()
    {
        var finder = new CsvRecordFinder();
        Assert.Equal(5, finder.Find("a,b\"c\nd,e\n"u8, out var next));
        Assert.Equal((6, 0), (next, finder.InnerLines));
    }

    // Commas around the edges of the 32 bytes that are looked at together, bytes beyond ASCII likewise.
    [Fact]
    public void Records_of_every_length_are_split_at_every_place() => Gen.Select(Gen.Int[0, 100], Gen.Int[0, 100], Gen.Int[0, 100]).Sample((length, comma, odd) =>
    {
        var record = new byte[length];
        Array.Fill(record, (byte)'x');
        if (odd < length)
        {
            record[odd] = 0xFF;
        }

        if (comma < length)
        {
            record[comma] = (byte)',';
        }

        var row = new CsvRow();
        row.Split(record, out var text);
        Assert.Equal(comma < length ? [comma, length - comma - 1] : new[] { length }, row.Fields.ToArray().Select(field => field.Length));
        Assert.Equal(record.All(value => value < 0x80), row.IsUtf8);
        Assert.True(row.IsWellFormed);
    });

    private static string Written((string Value, bool Quoted) field) =>
        field.Quoted || field.Value.AsSpan().ContainsAny(",\"\r\n")
            ? $"\"{field.Value.Replace("\"", "\"\"", StringComparison.Ordinal)}\""
            : field.Value;

    private static List<string[]> Split(byte[] text, int piece, out int lines)
    {
        var (finder, row, records) = (new CsvRecordFinder(), new CsvRow(), new List<string[]>());
        (lines, var start) = (0, 0);
        for (var end = Math.Min(piece, text.Length); start < text.Length;)
        {
            var arrived = text.AsSpan(start..end);
            var length = finder.Find(arrived, out var next);
            if (length < 0)
            {
                Assert.True(end < text.Length);
                end = Math.Min(end + piece, text.Length);
                continue;
            }

            row.Split(arrived[..length], out var fields);
            Assert.True(row.IsWellFormed);
            records.Add(Fields(row, fields));
            lines += 1 + finder.InnerLines;
            finder.Reset();
            start += next;
        }

        return records;
    }

    private static string[] Fields(CsvRow row, ReadOnlySpan<byte> text)
    {
        var fields = new string[row.Count];
        for (var n = 0; n < fields.Length; n++)
        {
            fields[n] = Encoding.UTF8.GetString(row.Fields[n].Of(text));
        }

        return fields;
    }
}
