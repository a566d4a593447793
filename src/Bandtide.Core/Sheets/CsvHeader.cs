using System.Text;

namespace Bandtide.Core.Sheets;

/// <summary>Which column of a CSV body holds which field.</summary>
internal sealed class CsvHeader
{
    private const string DateColumn = "date";
    private readonly int[] fieldOfColumn;

    private CsvHeader(int[] fieldOfColumn, int dateColumn, IReadOnlyList<string> unknown) =>
        (this.fieldOfColumn, Date, Unknown) = (fieldOfColumn, dateColumn, unknown);

    /// <summary>Number of columns.</summary>
    public int Columns => fieldOfColumn.Length;

    /// <summary>Place of the date column, or -1.</summary>
    public int Date { get; }

    /// <summary>Columns that the contract does not know.</summary>
    public IReadOnlyList<string> Unknown { get; }

    /// <summary>Reads the header line.</summary>
    /// <param name="fields">Its fields.</param>
    /// <param name="row">The text they point into.</param>
    /// <param name="needsDate">Whether a date column is required (many days).</param>
    /// <param name="problems">Receives every problem.</param>
    public static CsvHeader? Read(ReadOnlySpan<FieldSlice> fields, ReadOnlySpan<byte> row, bool needsDate, ICollection<SheetProblem> problems)
    {
        var columns = new int[fields.Length];
        var seen = new HashSet<string>(StringComparer.Ordinal);
        var unknown = new List<string>();
        var date = -1;
        for (var c = 0; c < columns.Length; c++)
        {
            var name = Encoding.UTF8.GetString(fields[c].Of(row));
            columns[c] = Array.IndexOf([.. SheetFields.Csv], name);
            if (!seen.Add(name))
            {
                problems.Add(new(1, Short(name), SheetRule.ColumnTwice, $"The column '{Short(name)}' stands in the header twice."));
            }
            else if (string.Equals(name, DateColumn, StringComparison.Ordinal))
            {
                date = c;
            }
            else if (columns[c] < 0)
            {
                unknown.Add(Short(name));
            }
        }

        var required = Enum.GetValues<SheetField>().Where(SheetFields.IsRequired).Select(field => SheetFields.Csv[(int)field]);
        foreach (var name in needsDate ? required.Prepend(DateColumn) : required)
        {
            if (!seen.Contains(name))
            {
                problems.Add(new(1, name, SheetRule.ColumnMissing, $"The header has no column '{name}'."));
            }
        }

        return problems.Count == 0 ? new(columns, date, unknown) : null;
    }

    /// <summary>Sorts a row's fields by <see cref="SheetField"/>.</summary>
    public void Sort(ReadOnlySpan<FieldSlice> row, Span<FieldSlice> byField)
    {
        byField.Fill(FieldSlice.Absent);
        for (var c = 0; c < fieldOfColumn.Length; c++)
        {
            if (fieldOfColumn[c] >= 0)
            {
                byField[fieldOfColumn[c]] = row[c];
            }
        }
    }

    /// <summary>The warning about columns that were ignored, if any.</summary>
    public IReadOnlyList<SheetWarning> Warnings() => Unknown.Count == 0
        ? []
        : [new(SheetRule.ColumnUnknown, Unknown.Count, null, null, $"Ignored columns: {string.Join(", ", Unknown.Take(10))}.")];

    private static string Short(string name) => name.Length <= 40 ? name : name[..40] + "…";
}
