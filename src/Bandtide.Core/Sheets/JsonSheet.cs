using System.Globalization;
using System.Text.Json;
using System.Text.Unicode;

namespace Bandtide.Core.Sheets;

/// <summary>Reads the JSON text of one day sheet.</summary>
internal static class JsonSheet
{
    private const int MaxShownUnknown = 10;
    private static readonly JsonReaderOptions Options = new() { MaxDepth = 16 };

    /// <summary>Finds the date in a text.</summary>
    /// <param name="text">The text.</param>
    /// <param name="date">The date as written, <c>null</c> where there is none.</param>
    /// <param name="reason">Why the text is no sheet.</param>
    /// <returns>False when the text is no JSON object as far as it had to be read.</returns>
    public static bool TryFindDate(ReadOnlySpan<byte> text, out string? date, out string reason)
    {
        (date, reason) = (null, "");
        try
        {
            var reader = new Utf8JsonReader(text, Options);
            if (!reader.Read() || reader.TokenType != JsonTokenType.StartObject)
            {
                reason = "The text is not a JSON object.";
                return false;
            }

            while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
            {
                var isDate = reader.ValueTextEquals("date"u8);
                reader.Read();
                if (isDate)
                {
                    date = reader.TokenType == JsonTokenType.String ? reader.GetString() : null;
                    return true;
                }

                reader.Skip();
            }

            return true;
        }
        catch (Exception e) when (e is JsonException or InvalidOperationException)
        {
            reason = Reason(e);
            return false;
        }
    }

    /// <summary>Reads the cells.</summary>
    /// <param name="text">The text.</param>
    /// <param name="builder">Receives the cells.</param>
    /// <param name="isJson">Whether the text is a JSON object in UTF-8; otherwise the last problem says why not.</param>
    public static SheetReading Read(ReadOnlySpan<byte> text, SheetBuilder builder, out bool isJson)
    {
        isJson = Utf8.IsValid(text);
        if (!isJson)
        {
            builder.Problems.Add(0, "", SheetRule.Utf8, "The text is not UTF-8.");
            return builder.Build([]);
        }

        var unknown = new SortedSet<string>(StringComparer.Ordinal);
        try
        {
            isJson = ReadObject(text, builder, unknown);
        }
        catch (Exception e) when (e is JsonException or InvalidOperationException)
        {
            builder.Problems.Add(0, "", SheetRule.JsonSyntax, Reason(e));
            isJson = false;
        }

        return builder.Build(unknown.Count == 0
            ? []
            : [new(SheetRule.ColumnUnknown, unknown.Count, null, null, $"Ignored fields: {string.Join(", ", unknown.Take(MaxShownUnknown).Select(name => $"'{ShownText.Cut(name)}'"))}.")]);
    }

    private static bool ReadObject(ReadOnlySpan<byte> text, SheetBuilder builder, SortedSet<string> unknown)
    {
        var reader = new Utf8JsonReader(text, Options);
        if (!reader.Read() || reader.TokenType != JsonTokenType.StartObject)
        {
            builder.Problems.Add(0, "", SheetRule.JsonSyntax, "The text is not a JSON object.");
            return false;
        }

        var (dates, lists) = (0, 0);
        while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
        {
            if (reader.ValueTextEquals("cells"u8))
            {
                reader.Read();
                if (++lists == 1 && reader.TokenType == JsonTokenType.StartArray)
                {
                    ReadCells(ref reader, text, builder, unknown);
                    continue;
                }

                builder.Problems.Add(0, "cells", SheetRule.JsonSyntax, "cells must be one list of objects.");
            }
            else if (reader.ValueTextEquals("date"u8))
            {
                reader.Read();
                if (++dates > 1 || reader.TokenType != JsonTokenType.String)
                {
                    builder.Problems.Add(0, "date", SheetRule.DateSyntax, "date must be one text, yyyy-MM-dd.");
                }
            }
            else
            {
                unknown.Add(reader.GetString()!);
                reader.Read();
            }

            reader.Skip();
        }

        // Nothing may follow the object.
        reader.Read();
        return true;
    }

    private static void ReadCells(ref Utf8JsonReader reader, ReadOnlySpan<byte> text, SheetBuilder builder, SortedSet<string> unknown)
    {
        Span<FieldSlice> slices = stackalloc FieldSlice[SheetFields.Count];
        for (var place = 1; reader.Read() && reader.TokenType != JsonTokenType.EndArray; place++)
        {
            if (reader.TokenType == JsonTokenType.StartObject)
            {
                slices.Fill(FieldSlice.Absent);
                ReadCell(ref reader, text, place, slices, builder, unknown);
            }
            else
            {
                builder.Problems.Add(place, "cells", SheetRule.JsonSyntax, "A cell must be an object.");
                reader.Skip();
            }
        }
    }

    private static void ReadCell(
        ref Utf8JsonReader reader, ReadOnlySpan<byte> text, int place, scoped Span<FieldSlice> slices, SheetBuilder builder, SortedSet<string> unknown)
    {
        var (seen, told, expected) = (0, 0, 0);
        string? escapedCode = null;
        while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
        {
            var field = FieldOf(ref reader, expected);
            if (field < 0)
            {
                unknown.Add(reader.GetString()!);
                reader.Read();
                reader.Skip();
                continue;
            }

            expected = field + 1;
            reader.Read();
            var isBand = field == (int)SheetField.Band;
            if ((seen & (1 << field)) != 0)
            {
                builder.Problems.Add(place, SheetFields.Json[field], SheetRule.ColumnTwice, $"{SheetFields.Json[field]} stands in the cell twice.");
                told |= 1 << field;
                reader.Skip();
            }
            else if (isBand && reader.TokenType == JsonTokenType.String && reader.ValueIsEscaped)
            {
                escapedCode = reader.GetString();
            }
            else if (reader.TokenType == (isBand ? JsonTokenType.String : JsonTokenType.Number))
            {
                slices[field] = new((int)reader.TokenStartIndex + (isBand ? 1 : 0), reader.ValueSpan.Length);
            }
            else if (reader.TokenType != JsonTokenType.Null)
            {
                TellWrongKind(ref reader, place, field, builder);
                told |= 1 << field;
                reader.Skip();
            }

            seen |= 1 << field;
        }

        var code = escapedCode is null ? slices[(int)SheetField.Band].Of(text) : System.Text.Encoding.UTF8.GetBytes(escapedCode);
        builder.AddCell(place, code, text, slices, told);
    }

    private static void TellWrongKind(ref Utf8JsonReader reader, int place, int field, SheetBuilder builder)
    {
        var name = SheetFields.Json[field];
        if (field == (int)SheetField.Band)
        {
            builder.Problems.Add(place, name, SheetRule.BandUnknown, "band must be the code of a band as a text.");
        }
        else if (reader.TokenType == JsonTokenType.String && DecimalText.Read(reader.ValueSpan, 0).Status == DecimalStatus.NotFinite)
        {
            builder.Problems.Add(place, name, SheetRule.NotFinite, $"{ShownText.Quote(reader.ValueSpan)} is not a finite number; leave an unknown optional value out.");
        }
        else
        {
            builder.Problems.Add(place, name, SheetRule.NumberSyntax, $"{name} must be a number.");
        }
    }

    // Programs write the fields of all cells in one order: the one behind the last is tried first.
    private static int FieldOf(ref Utf8JsonReader reader, int expected)
    {
        for (var n = 0; n < SheetFields.Count; n++)
        {
            var field = (expected + n) % SheetFields.Count;
            if (reader.ValueIsEscaped ? reader.ValueTextEquals(SheetFields.JsonUtf8[field]) : reader.ValueSpan.SequenceEqual(SheetFields.JsonUtf8[field]))
            {
                return field;
            }
        }

        return -1;
    }

    private static string Reason(Exception e) => e is JsonException json
        ? string.Create(CultureInfo.InvariantCulture, $"The text is not valid JSON: line {json.LineNumber + 1}, byte {json.BytePositionInLine + 1}.")
        : "The text is not valid JSON: a text in it is not UTF-16 or UTF-8.";
}
