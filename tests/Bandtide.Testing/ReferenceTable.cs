using System.Collections;
using nietras.SeparatedValues;

namespace Bandtide.Testing;

/// <summary>One of the CSV files in <c>Reference/</c>, read whole; <c>Reference/README.md</c> tells where each comes from.</summary>
public sealed class ReferenceTable : IReadOnlyList<ReferenceRow>
{
    private readonly List<ReferenceRow> rows = [];

    private ReferenceTable(string path)
    {
        using var reader = Sep.New(',').Reader(options => options with { Unescape = true }).FromFile(path);
        var columns = reader.Header.ColNames.Select((name, index) => (name, index)).ToDictionary(column => column.name, column => column.index, StringComparer.Ordinal);
        foreach (var row in reader)
        {
            var values = new string[columns.Count];
            for (var i = 0; i < values.Length; i++)
            {
                values[i] = row[i].ToString();
            }

            rows.Add(new(Path.GetFileName(path), row.LineNumberFrom, columns, values));
        }
    }

    /// <inheritdoc/>
    public int Count => rows.Count;

    /// <inheritdoc/>
    public ReferenceRow this[int index] => rows[index];

    /// <summary>Reads a file of the reference folder, such as <c>great_circle.csv</c>.</summary>
    /// <exception cref="FileNotFoundException">There is no such file beside the tests.</exception>
    public static ReferenceTable Load(string fileName) => new(Path.Combine(AppContext.BaseDirectory, "Reference", fileName));

    /// <inheritdoc/>
    public IEnumerator<ReferenceRow> GetEnumerator() => rows.GetEnumerator();

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();
}
