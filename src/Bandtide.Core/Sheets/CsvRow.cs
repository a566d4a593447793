namespace Bandtide.Core.Sheets;

/// <summary>Splits one CSV record of RFC 4180 into its fields. Reused from row to row.</summary>
internal sealed class CsvRow
{
    private FieldSlice[] fields = new FieldSlice[16];
    private byte[] unquoted = [];

    /// <summary>The fields, valid until the next row.</summary>
    public ReadOnlySpan<FieldSlice> Fields => fields.AsSpan(0, Count);

    /// <summary>Number of fields.</summary>
    public int Count { get; private set; }

    /// <summary>Splits a record.</summary>
    /// <param name="record">Without its line end.</param>
    /// <param name="text">What the slices point into: the record, or a copy without quotes.</param>
    /// <returns>False when a quote stands inside an unquoted field, or text follows a closing quote.</returns>
    public bool Split(ReadOnlySpan<byte> record, out ReadOnlySpan<byte> text)
    {
        Count = 0;
        text = record;
        if (record.Contains((byte)'"'))
        {
            return SplitQuoted(record, out text);
        }

        var start = 0;
        while (true)
        {
            var length = record[start..].IndexOf((byte)',');
            if (length < 0)
            {
                Add(new(start, record.Length - start));
                return true;
            }

            Add(new(start, length));
            start += length + 1;
        }
    }

    private bool SplitQuoted(ReadOnlySpan<byte> record, out ReadOnlySpan<byte> text)
    {
        if (unquoted.Length < record.Length)
        {
            unquoted = new byte[record.Length];
        }

        var (i, length) = (0, 0);
        text = default;
        while (true)
        {
            var start = length;
            if (i < record.Length && record[i] == '"')
            {
                i++;
                while (true)
                {
                    if (i >= record.Length)
                    {
                        return false;
                    }

                    if (record[i] != '"')
                    {
                        unquoted[length++] = record[i++];
                    }
                    else if (i + 1 < record.Length && record[i + 1] == '"')
                    {
                        unquoted[length++] = (byte)'"';
                        i += 2;
                    }
                    else
                    {
                        i++;
                        break;
                    }
                }

                if (i < record.Length && record[i] != ',')
                {
                    return false;
                }
            }
            else
            {
                while (i < record.Length && record[i] != ',')
                {
                    if (record[i] == '"')
                    {
                        return false;
                    }

                    unquoted[length++] = record[i++];
                }
            }

            Add(new(start, length - start));
            if (i >= record.Length)
            {
                text = unquoted.AsSpan(0, length);
                return true;
            }

            i++;
        }
    }

    private void Add(FieldSlice field)
    {
        if (Count == fields.Length)
        {
            Array.Resize(ref fields, fields.Length * 2);
        }

        fields[Count++] = field;
    }
}
