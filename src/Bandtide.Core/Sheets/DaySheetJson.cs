using System.Buffers;
using System.Text;
using System.Text.Json;
using System.Text.Unicode;
using Bandtide.Core.Bands;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>One day sheet as JSON: <c>{"date":"2026-06-01","cells":[{"hour":0,"band":"bc-49m",...}]}</c>.</summary>
public static class DaySheetJson
{
    private const int MaxShownUnknown = 10;

    /// <summary>Reads a body.</summary>
    /// <param name="body">The whole body.</param>
    /// <param name="date">The date it must have; the body's <c>date</c> may be left out.</param>
    /// <param name="context">Plan and moment of judgement.</param>
    public static SheetReading Read(ReadOnlySpan<byte> body, DateOnly date, SheetContext context)
    {
        ArgumentNullException.ThrowIfNull(context);
        var text = CsvRecords.WithoutMark(body);
        var builder = new SheetBuilder(context, SheetFields.Json, date, 0);
        if (!TryDate(text, out var told, out var problem))
        {
            return new(null, [problem], []);
        }

        if (told is not null && !string.Equals(told, DateText.Format(date), StringComparison.Ordinal))
        {
            builder.Add(0, "date", SheetRule.DateMismatch, $"{SheetBuilder.Quote(Encoding.UTF8.GetBytes(told))} is not the day being sent, {DateText.Format(date)}.");
        }

        return ReadCells(text, builder);
    }

    /// <summary>Writes a sheet.</summary>
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
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            for (var b = 0; b < cells.BandCount; b++)
            {
                if (!cells.Has(hour, b))
                {
                    continue;
                }

                writer.WriteStartObject();
                writer.WriteNumber(SheetFields.Json[(int)SheetField.Hour], hour);
                writer.WriteString(SheetFields.Json[(int)SheetField.Band], plan.ById(cells.BandIds[b])?.Code);
                for (var quantity = Quantity.Sweeps; quantity <= Quantity.Coverage; quantity++)
                {
                    var value = cells[quantity, hour, b];
                    if (value != CellGrid.Missing)
                    {
                        writer.WriteNumber(SheetFields.Json[(int)SheetFields.FieldOf(quantity)], FixedPoint.Number(value, SheetFields.Decimals(quantity)));
                    }
                }

                writer.WriteEndObject();
            }
        }

        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    /// <summary>Checks that a body is one JSON object in UTF-8 and finds its date, <c>null</c> where it has none.</summary>
    internal static bool TryDate(ReadOnlySpan<byte> text, out string? date, out SheetProblem problem)
    {
        (date, problem) = (null, new(0, "", SheetRule.Utf8, "The body is not UTF-8."));
        if (!Utf8.IsValid(text))
        {
            return false;
        }

        try
        {
            var reader = new Utf8JsonReader(text, new JsonReaderOptions { MaxDepth = 16 });
            if (!reader.Read() || reader.TokenType != JsonTokenType.StartObject)
            {
                problem = new(0, "", SheetRule.JsonSyntax, "The body is not a JSON object.");
                return false;
            }

            while (reader.Read())
            {
                if (reader.CurrentDepth == 1 && reader.TokenType == JsonTokenType.PropertyName && reader.ValueTextEquals("date"u8))
                {
                    reader.Read();
                    if (date is not null || reader.TokenType != JsonTokenType.String)
                    {
                        problem = new(0, "date", SheetRule.DateSyntax, "date must be one text, yyyy-MM-dd.");
                        return false;
                    }

                    date = reader.GetString();
                }
            }

            return true;
        }
        catch (Exception e) when (e is JsonException or InvalidOperationException)
        {
            problem = new(0, "", SheetRule.JsonSyntax, $"The body is not valid JSON: {Where(e)}");
            return false;
        }
    }

    /// <summary>Reads the cells of a text that <see cref="TryDate"/> has found to be JSON.</summary>
    internal static SheetReading ReadCells(ReadOnlySpan<byte> text, SheetBuilder builder)
    {
        var unknown = new SortedSet<string>(StringComparer.Ordinal);
        try
        {
            var reader = new Utf8JsonReader(text, new JsonReaderOptions { MaxDepth = 16 });
            reader.Read();
            var anyCells = false;
            while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
            {
                if (!reader.ValueTextEquals("cells"u8))
                {
                    if (!reader.ValueTextEquals("date"u8))
                    {
                        unknown.Add(reader.GetString()!);
                    }

                    reader.Skip();
                    continue;
                }

                reader.Read();
                if (anyCells || reader.TokenType != JsonTokenType.StartArray)
                {
                    builder.Add(0, "cells", SheetRule.JsonSyntax, "cells must be one list of objects.");
                    break;
                }

                anyCells = true;
                for (var place = 1; reader.Read() && reader.TokenType != JsonTokenType.EndArray; place++)
                {
                    ReadCell(ref reader, text, place, builder, unknown);
                }
            }
        }
        catch (Exception e) when (e is JsonException or InvalidOperationException)
        {
            builder.Add(0, "", SheetRule.JsonSyntax, $"The body is not valid JSON: {Where(e)}");
        }

        return builder.Build(unknown.Count == 0
            ? []
            : [new(SheetRule.ColumnUnknown, unknown.Count, null, null, $"Ignored fields: {string.Join(", ", unknown.Take(MaxShownUnknown).Select(Short))}.")]);
    }

    private static void ReadCell(ref Utf8JsonReader reader, ReadOnlySpan<byte> text, int place, SheetBuilder builder, SortedSet<string> unknown)
    {
        if (reader.TokenType != JsonTokenType.StartObject)
        {
            builder.Add(place, "cells", SheetRule.JsonSyntax, "A cell must be an object.");
            reader.Skip();
            return;
        }

        Span<FieldSlice> slices = stackalloc FieldSlice[SheetFields.Count];
        slices.Fill(FieldSlice.Absent);
        var (good, seen) = (true, 0);
        while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
        {
            var field = FieldOf(ref reader);
            if (field < 0)
            {
                unknown.Add(reader.GetString()!);
                reader.Skip();
                continue;
            }

            var name = SheetFields.Json[field];
            reader.Read();
            if ((seen & (1 << field)) != 0)
            {
                builder.Add(place, name, SheetRule.ColumnTwice, $"{name} stands in the cell twice.");
                good = false;
            }

            seen |= 1 << field;
            var wanted = field == (int)SheetField.Band ? JsonTokenType.String : JsonTokenType.Number;
            if (reader.TokenType == wanted && !reader.ValueIsEscaped)
            {
                var start = (int)reader.TokenStartIndex + (wanted == JsonTokenType.String ? 1 : 0);
                slices[field] = new(start, reader.ValueSpan.Length);
                if (reader.ValueSpan.IsEmpty)
                {
                    slices[field] = FieldSlice.Absent;
                }
            }
            else if (reader.TokenType != JsonTokenType.Null)
            {
                var rule = field == (int)SheetField.Band ? SheetRule.BandUnknown : IsWordForInfinity(ref reader) ? SheetRule.NotFinite : SheetRule.NumberSyntax;
                builder.Add(place, name, rule, field == (int)SheetField.Band ? "band must be the code of a band as plain text." : $"{name} must be a finite number.");
                good = false;
                reader.Skip();
            }
        }

        if (good)
        {
            builder.AddCell(place, text, slices);
        }
    }

    private static int FieldOf(ref Utf8JsonReader reader)
    {
        for (var field = 0; field < SheetFields.Count; field++)
        {
            if (reader.ValueTextEquals(SheetFields.Json[field]))
            {
                return field;
            }
        }

        return -1;
    }

    private static bool IsWordForInfinity(ref Utf8JsonReader reader) => reader.TokenType == JsonTokenType.String
        && !reader.ValueIsEscaped && DecimalText.Read(reader.ValueSpan, 0).Status == DecimalStatus.NotFinite;

    private static string Where(Exception e) => e is JsonException json
        ? string.Create(System.Globalization.CultureInfo.InvariantCulture, $"line {json.LineNumber + 1}, byte {json.BytePositionInLine + 1}.")
        : "a text is not valid.";

    private static string Short(string name) => name.Length <= 40 ? name : name[..40] + "…";
}
