using System.Buffers;
using System.Text;
using System.Text.Unicode;
using Bandtide.Core.Bands;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>One day sheet as CSV: RFC 4180, UTF-8 with or without byte order mark, LF or CRLF, decimal point.</summary>
/// <remarks>Blanks around a value are not trimmed: RFC 4180 makes them part of the field.</remarks>
public static class DaySheetCsv
{
    /// <summary>Reads a body.</summary>
    /// <param name="body">The whole body.</param>
    /// <param name="date">Date of the sheet; a <c>date</c> column, if there is one, must say the same.</param>
    /// <param name="context">Plan and moment of judgement.</param>
    public static SheetReading Read(ReadOnlySpan<byte> body, DateOnly date, SheetContext context)
    {
        ArgumentNullException.ThrowIfNull(context);
        var builder = new SheetBuilder(context, SheetFields.Csv, date, 0);
        var text = CsvRecords.WithoutMark(body);
        if (!Utf8.IsValid(text))
        {
            builder.Add(0, "", SheetRule.Utf8, "The body is not UTF-8.");
            return builder.Build([]);
        }

        CsvHeader? header = null;
        var row = new CsvRow();
        Span<FieldSlice> byField = stackalloc FieldSlice[SheetFields.Count];
        var expected = Encoding.ASCII.GetBytes(DateText.Format(date));
        for (var line = 1; !text.IsEmpty;)
        {
            var length = CsvRecords.Find(text, out var lines, out var next, out var openQuote);
            if (length < 0)
            {
                if (openQuote)
                {
                    builder.Add(line, "", SheetRule.QuoteUnclosed, "A quote opened on this line is never closed.");
                    break;
                }

                (length, next) = (text.Length, text.Length);
            }

            var record = text[..length];
            text = text[next..];
            if (!record.IsEmpty)
            {
                if (!row.Split(record, out var fields))
                {
                    builder.Add(line, "", SheetRule.QuoteSyntax, "A quote stands where RFC 4180 allows none.");
                }
                else if (header is null)
                {
                    var problems = new List<SheetProblem>();
                    header = CsvHeader.Read(row.Fields, fields, needsDate: false, problems);
                    if (header is null)
                    {
                        return new(null, problems, []);
                    }
                }
                else if (row.Count != header.Columns)
                {
                    builder.Add(line, "", SheetRule.FieldCount, $"The line has {row.Count} fields, the header {header.Columns}.");
                }
                else
                {
                    header.Sort(row.Fields, byField);
                    builder.AddCell(line, fields, byField);
                    if (header.Date >= 0 && !row.Fields[header.Date].Of(fields).SequenceEqual(expected))
                    {
                        builder.Add(line, "date", SheetRule.DateMismatch, $"{SheetBuilder.Quote(row.Fields[header.Date].Of(fields))} is not the day being sent, {DateText.Format(date)}.");
                    }
                }
            }

            line += lines;
        }

        if (header is null && !builder.HasProblems)
        {
            builder.Add(1, "", SheetRule.HeaderMissing, "The body is empty; it must begin with a header line.");
        }

        return builder.Build(header?.Warnings() ?? []);
    }

    /// <summary>Writes a sheet with all columns, rows by hour, then band identity.</summary>
    public static void Write(IBufferWriter<byte> writer, CellGrid cells, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(writer);
        ArgumentNullException.ThrowIfNull(cells);
        ArgumentNullException.ThrowIfNull(plan);
        var text = new StringBuilder(string.Join(',', SheetFields.Csv)).Append('\n');
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            for (var b = 0; b < cells.BandCount; b++)
            {
                if (cells.Has(hour, b))
                {
                    AppendCell(text, cells, plan, hour, b);
                }
            }
        }

        Encoding.UTF8.GetBytes(text.ToString(), writer);
    }

    private static void AppendCell(StringBuilder text, CellGrid cells, BandPlan plan, int hour, int b)
    {
        text.Append(hour).Append(',').Append(plan.ById(cells.BandIds[b])?.Code);
        for (var quantity = Quantity.Sweeps; quantity <= Quantity.Coverage; quantity++)
        {
            text.Append(',');
            var value = cells[quantity, hour, b];
            if (value != CellGrid.Missing)
            {
                text.Append(FixedPoint.Text(value, SheetFields.Decimals(quantity)));
            }
        }

        text.Append('\n');
    }
}
