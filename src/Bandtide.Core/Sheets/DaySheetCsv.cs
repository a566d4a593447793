using System.Buffers;
using System.Buffers.Text;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>One day sheet as CSV: RFC 4180, UTF-8 with or without byte order mark, LF or CRLF, decimal point.</summary>
/// <remarks>Blanks around a value are not trimmed: RFC 4180 makes them part of the field. Empty lines are passed over.</remarks>
public static class DaySheetCsv
{
    // Date, hour, code of at most 24 characters, and eight values of at most ten, each with what separates it.
    private const int MaxRowBytes = 160;

    /// <summary>Reads a body.</summary>
    /// <param name="body">The whole body.</param>
    /// <param name="date">Date of the sheet; a <c>date</c> column, if there is one, must say the same.</param>
    /// <param name="context">Plan and moment of judgement.</param>
    public static SheetReading Read(ReadOnlySpan<byte> body, DateOnly date, SheetContext context)
    {
        ArgumentNullException.ThrowIfNull(context);
        var builder = new SheetBuilder(context, SheetFields.Csv, date, 0);
        var expected = Encoding.ASCII.GetBytes(DateText.Format(date));
        var records = new CsvRecordFinder();
        var row = new CsvRow();
        CsvHeader? header = null;
        var line = 1;
        for (var rest = body[Utf8Mark.LengthIn(body)..]; !rest.IsEmpty;)
        {
            var length = records.Find(rest, out var next);
            if (length < 0 && records.InsideQuotes)
            {
                builder.Problems.Add(line, "", SheetRule.QuoteUnclosed, "A quote opened on this line is never closed.");
                return builder.Build([]);
            }

            var record = length < 0 ? CsvRecordFinder.WithoutReturn(rest) : rest[..length];
            rest = length < 0 ? default : rest[next..];
            if (!record.IsEmpty)
            {
                row.Split(record, out var text);
                if (header is not null)
                {
                    AddRow(header, builder, line, row, text, expected);
                }
                else if ((header = CsvHeader.Read(line, row, text, needsDate: false, builder.Problems)) is null)
                {
                    return builder.Build([]);
                }
            }

            line += 1 + records.InnerLines;
            records.Reset();
        }

        if (header is null)
        {
            builder.Problems.Add(1, "", SheetRule.HeaderMissing, "The body is empty; it must begin with a header line.");
        }

        return builder.Build(header?.Warnings() ?? []);
    }

    /// <summary>Writes a sheet with all columns, rows by hour, then band identity.</summary>
    /// <exception cref="ArgumentException">A band is not in the plan.</exception>
    public static void Write(IBufferWriter<byte> writer, CellGrid cells, BandPlan plan)
    {
        WriteHeader(writer, withDate: false);
        WriteRows(writer, null, cells, plan);
    }

    /// <summary>Writes the header line of one sheet or, with a <c>date</c> column before the others, of many.</summary>
    public static void WriteHeader(IBufferWriter<byte> writer, bool withDate)
    {
        ArgumentNullException.ThrowIfNull(writer);
        Encoding.ASCII.GetBytes((withDate ? "date," : "") + string.Join(',', SheetFields.Csv) + "\n", writer);
    }

    /// <summary>Writes the rows of one of many sheets, its date in each.</summary>
    /// <exception cref="ArgumentException">A band is not in the plan.</exception>
    public static void WriteRows(IBufferWriter<byte> writer, DaySheet sheet, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(sheet);
        WriteRows(writer, DateText.Format(sheet.Date) + ",", sheet.Cells, plan);
    }

    private static void AddRow(CsvHeader header, SheetBuilder builder, int line, CsvRow row, ReadOnlySpan<byte> text, ReadOnlySpan<byte> expected)
    {
        header.AddRow(builder, line, row, text);
        if (header.Date < 0 || row.Count != header.Columns)
        {
            return;
        }

        var told = row.Fields[header.Date].Of(text);
        if (!told.SequenceEqual(expected))
        {
            builder.Problems.Add(line, "date", SheetRule.DateMismatch, $"{ShownText.Quote(told)} is not the day being sent, {Encoding.ASCII.GetString(expected)}.");
        }
    }

    private static void WriteRows(IBufferWriter<byte> writer, string? start, CellGrid cells, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(writer);
        ArgumentNullException.ThrowIfNull(cells);
        ArgumentNullException.ThrowIfNull(plan);
        var codes = plan.CodesOf(cells).Select(Encoding.ASCII.GetBytes).ToArray();
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            for (var b = 0; b < cells.BandCount; b++)
            {
                if (cells.Has(hour, b))
                {
                    var target = writer.GetSpan(MaxRowBytes);
                    var length = Encoding.ASCII.GetBytes(start, target);
                    writer.Advance(length + WriteRow(target[length..], cells, hour, b, codes[b]));
                }
            }
        }
    }

    private static int WriteRow(Span<byte> target, CellGrid cells, int hour, int band, ReadOnlySpan<byte> code)
    {
        Utf8Formatter.TryFormat(hour, target, out var length);
        target[length++] = (byte)',';
        code.CopyTo(target[length..]);
        length += code.Length;
        for (var quantity = Quantity.Sweeps; quantity <= Quantity.Coverage; quantity++)
        {
            target[length++] = (byte)',';
            var value = cells[quantity, hour, band];
            if (value != CellGrid.Missing)
            {
                length += FixedPoint.Write(target[length..], value, SheetFields.Decimals(quantity));
            }
        }

        target[length++] = (byte)'\n';
        return length;
    }
}
