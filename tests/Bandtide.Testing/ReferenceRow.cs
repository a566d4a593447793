using System.Globalization;

namespace Bandtide.Testing;

/// <summary>One line of a <see cref="ReferenceTable"/>; its text form names file and line, for messages of failing tests.</summary>
public sealed class ReferenceRow
{
    private readonly string file;
    private readonly int line;
    private readonly IReadOnlyDictionary<string, int> columns;
    private readonly string[] values;

    internal ReferenceRow(string file, int line, IReadOnlyDictionary<string, int> columns, string[] values) =>
        (this.file, this.line, this.columns, this.values) = (file, line, columns, values);

    /// <summary>The text of a column as it stands, empty where nothing is given.</summary>
    /// <exception cref="KeyNotFoundException">There is no such column.</exception>
    public string Text(string column) => values[columns[column]];

    /// <summary>The number in a column.</summary>
    /// <exception cref="FormatException">It holds no number.</exception>
    public double Number(string column) => double.Parse(Text(column), NumberStyles.Float, CultureInfo.InvariantCulture);

    /// <summary>The number in a column, or <c>null</c> where it is empty.</summary>
    public double? NumberOrNull(string column) => Text(column).Length == 0 ? null : Number(column);

    /// <summary>The instant in a column (ISO 8601 with offset), or <c>null</c> where it is empty.</summary>
    public DateTimeOffset? InstantOrNull(string column) => Text(column).Length == 0 ? null : Instant(column);

    /// <summary>The instant in a column (ISO 8601 with offset).</summary>
    /// <exception cref="FormatException">It holds none.</exception>
    public DateTimeOffset Instant(string column) => DateTimeOffset.Parse(Text(column), CultureInfo.InvariantCulture);

    /// <inheritdoc/>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{file}:{line}");
}
