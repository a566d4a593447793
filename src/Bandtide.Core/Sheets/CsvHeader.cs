using System.Text;

namespace Bandtide.Core.Sheets;

/// <summary>Which column of a CSV body holds which field.</summary>
internal sealed class CsvHeader
{
    private const string DateColumn = "date";
    private const int MaxShownUnknown = 10;

    private readonly int[] columnOfField = new int[SheetFields.Count];
    private readonly List<string> unknown = [];
    private int unknownCount;

    private CsvHeader(int columns)
    {
        Columns = columns;
        Array.Fill(columnOfField, -1);
    }

    /// <summary>Number of columns.</summary>
    public int Columns { get; }

    /// <summary>Place of the date column, or -1.</summary>
    public int Date { get; private set; } = -1;

    /// <summary>Reads the header line.</summary>
    /// <param name="line">Its line.</param>
    /// <param name="row">The line, split.</param>
    /// <param name="text">The text that its fields point into.</param>
    /// <param name="needsDate">Whether a date column is required (many days).</param>
    /// <param name="problems">Receives every problem.</param>
    /// <returns>The header, or <c>null</c> when there are problems.</returns>
    public static CsvHeader? Read(int line, CsvRow row, ReadOnlySpan<byte> text, bool needsDate, ProblemList problems)
    {
        if (!row.IsUtf8 || !row.IsWellFormed)
        {
            RowProblem(line, row, row.Count, problems);
            return null;
        }

        var header = new CsvHeader(row.Count);
        for (var column = 0; column < row.Count; column++)
        {
            header.Place(line, column, row.Fields[column].Of(text), problems);
        }

        if (needsDate && header.Date < 0)
        {
            problems.Add(line, DateColumn, SheetRule.ColumnMissing, "The header has no column 'date'.");
        }

        for (var field = SheetField.Hour; field <= SheetField.Coverage; field++)
        {
            if (SheetFields.IsRequired(field) && header.columnOfField[(int)field] < 0)
            {
                var name = SheetFields.Csv[(int)field];
                problems.Add(line, name, SheetRule.ColumnMissing, $"The header has no column '{name}'.");
            }
        }

        return problems.Count == 0 ? header : null;
    }

    /// <summary>Judges a row below the header and adds its cell to a day.</summary>
    /// <param name="day">The day.</param>
    /// <param name="line">Line of the row.</param>
    /// <param name="row">The row, split.</param>
    /// <param name="text">The text that its fields point into.</param>
    public void AddRow(SheetBuilder day, int line, CsvRow row, ReadOnlySpan<byte> text)
    {
        if (!row.IsUtf8 || !row.IsWellFormed || row.Count != Columns)
        {
            RowProblem(line, row, Columns, day.Problems);
            return;
        }

        Span<FieldSlice> byField = stackalloc FieldSlice[SheetFields.Count];
        for (var field = 0; field < byField.Length; field++)
        {
            var column = columnOfField[field];
            byField[field] = column < 0 ? FieldSlice.Absent : row.Fields[column];
        }

        day.AddCell(line, byField[(int)SheetField.Band].Of(text), text, byField);
    }

    /// <summary>The warning about columns that were ignored, if any.</summary>
    public IReadOnlyList<SheetWarning> Warnings() => unknownCount == 0
        ? []
        : [new(SheetRule.ColumnUnknown, unknownCount, null, null, $"Ignored columns: {string.Join(", ", unknown.Select(name => $"'{name}'"))}{(unknownCount > unknown.Count ? " and more" : "")}.")];

    private static void RowProblem(int line, CsvRow row, int columns, ProblemList problems)
    {
        if (!row.IsUtf8)
        {
            problems.Add(line, "", SheetRule.Utf8, "The line is not UTF-8.");
        }
        else if (!row.IsWellFormed)
        {
            problems.Add(line, "", SheetRule.QuoteSyntax, "A quote stands where RFC 4180 allows none.");
        }
        else
        {
            problems.Add(line, "", SheetRule.FieldCount, $"The line has {row.Count} fields, the header {columns}.");
        }
    }

    // Only columns that are read must not come twice: the empty ones that spreadsheets leave at the end may.
    private void Place(int line, int column, ReadOnlySpan<byte> name, ProblemList problems)
    {
        var text = Encoding.UTF8.GetString(name);
        var isDate = string.Equals(text, DateColumn, StringComparison.Ordinal);
        var field = isDate ? -1 : SheetFields.FieldOfColumn(text);
        if (!isDate && field < 0)
        {
            if (unknownCount++ < MaxShownUnknown)
            {
                unknown.Add(ShownText.Cut(name));
            }
        }
        else if ((isDate ? Date : columnOfField[field]) >= 0)
        {
            problems.Add(line, text, SheetRule.ColumnTwice, $"The column '{text}' stands in the header twice.");
        }
        else if (isDate)
        {
            Date = column;
        }
        else
        {
            columnOfField[field] = column;
        }
    }
}
