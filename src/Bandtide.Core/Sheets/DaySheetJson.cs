using System.Buffers;
using System.Text;
using System.Text.Json;
using Bandtide.Core.Bands;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>One day sheet as JSON: <c>{"date":"2026-06-01","cells":[{"hour":0,"band":"bc-49m",...}]}</c>.</summary>
/// <remarks>An optional value that is unknown is left out or <c>null</c>. Fields that the contract does not know are ignored with a warning.</remarks>
public static class DaySheetJson
{
    /// <summary>Reads a body.</summary>
    /// <param name="body">The whole body.</param>
    /// <param name="date">The date it must have; the body's <c>date</c> may be left out.</param>
    /// <param name="context">Plan and moment of judgement.</param>
    public static SheetReading Read(ReadOnlySpan<byte> body, DateOnly date, SheetContext context)
    {
        ArgumentNullException.ThrowIfNull(context);
        var text = body[Utf8Mark.LengthIn(body)..];
        var builder = new SheetBuilder(context, SheetFields.Json, date, 0);
        if (JsonSheet.TryFindDate(text, out var told, out _) && told is not null && !string.Equals(told, DateText.Format(date), StringComparison.Ordinal))
        {
            builder.Problems.Add(0, "date", SheetRule.DateMismatch, $"{ShownText.Quote(Encoding.UTF8.GetBytes(told))} is not the day being sent, {DateText.Format(date)}.");
        }

        return JsonSheet.Read(text, builder, out _);
    }

    /// <summary>Writes a sheet on one line, cells by hour, then band identity; values that are unknown are left out.</summary>
    /// <exception cref="ArgumentException">A band is not in the plan.</exception>
    public static void Write(IBufferWriter<byte> output, DaySheet sheet, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(output);
        ArgumentNullException.ThrowIfNull(sheet);
        ArgumentNullException.ThrowIfNull(plan);
        using var writer = new Utf8JsonWriter(output);
        writer.WriteStartObject();
        writer.WriteString("date", DateText.Format(sheet.Date));
        writer.WriteStartArray("cells");
        var cells = sheet.Cells;
        var codes = plan.CodesOf(cells);
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            for (var b = 0; b < cells.BandCount; b++)
            {
                if (cells.Has(hour, b))
                {
                    WriteCell(writer, cells, hour, b, codes[b]);
                }
            }
        }

        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    private static void WriteCell(Utf8JsonWriter writer, CellGrid cells, int hour, int band, string code)
    {
        writer.WriteStartObject();
        writer.WriteNumber(SheetFields.Json[(int)SheetField.Hour], hour);
        writer.WriteString(SheetFields.Json[(int)SheetField.Band], code);
        for (var quantity = Quantity.Sweeps; quantity <= Quantity.Coverage; quantity++)
        {
            var value = cells[quantity, hour, band];
            if (value != CellGrid.Missing)
            {
                writer.WriteNumber(SheetFields.Json[(int)SheetFields.FieldOf(quantity)], FixedPoint.Number(value, SheetFields.Decimals(quantity)));
            }
        }

        writer.WriteEndObject();
    }
}
