using System.Buffers.Binary;
using System.Security.Cryptography;
using System.Text;
using Bandtide.Core.Bands;

namespace Bandtide.Core.Sheets;

/// <summary>A text that is equal exactly when the rounded cells are, whatever their order, format, date or storage.</summary>
/// <remarks>The first 128 bits of SHA-256 over the band codes in ordinal order, each followed by its cells by hour.</remarks>
public static class SheetChecksum
{
    /// <summary>Length of the text.</summary>
    public const int Length = 32;

    private const int CellBytes = 1 + (CellGrid.QuantityCount * sizeof(int));

    /// <summary>The checksum, 32 hexadecimal digits.</summary>
    /// <param name="grid">The cells.</param>
    /// <param name="plan">A plan that knows their bands.</param>
    /// <exception cref="ArgumentException">A band is not in the plan.</exception>
    public static string Compute(CellGrid grid, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(plan);
        var places = new (string Code, int Place)[grid.BandCount];
        var codes = plan.CodesOf(grid);
        for (var b = 0; b < places.Length; b++)
        {
            places[b] = (codes[b], b);
        }

        Array.Sort(places, (a, b) => string.CompareOrdinal(a.Code, b.Code));
        // Eight values of a cell and its hour take 33 bytes; a code and the line end behind it at most 25.
        var text = new byte[(grid.Count * CellBytes) + (places.Length * (Codes.MaxLength + 1))];
        var length = 0;
        foreach (var (code, band) in places)
        {
            var start = length;
            length += Encoding.UTF8.GetBytes(code, text.AsSpan(length));
            text[length++] = (byte)'\n';
            var cells = length;
            for (var hour = 0; hour < CellGrid.Hours; hour++)
            {
                if (grid.Has(hour, band))
                {
                    Append(grid, hour, band, text.AsSpan(length, CellBytes));
                    length += CellBytes;
                }
            }

            // A band without cells is as if it were not there.
            length = length == cells ? start : length;
        }

        return Convert.ToHexStringLower(SHA256.HashData(text.AsSpan(0, length)).AsSpan(0, Length / 2));
    }

    private static void Append(CellGrid grid, int hour, int band, Span<byte> target)
    {
        target[0] = (byte)hour;
        for (var quantity = 0; quantity < CellGrid.QuantityCount; quantity++)
        {
            BinaryPrimitives.WriteInt32LittleEndian(target[(1 + (quantity * sizeof(int)))..], grid[(Quantity)quantity, hour, band]);
        }
    }
}
