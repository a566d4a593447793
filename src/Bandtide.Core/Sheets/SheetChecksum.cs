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

    /// <summary>The checksum, 32 hexadecimal digits.</summary>
    /// <param name="grid">The cells.</param>
    /// <param name="plan">A plan that knows their bands.</param>
    /// <exception cref="ArgumentException">A band is not in the plan.</exception>
    public static string Compute(CellGrid grid, BandPlan plan)
    {
        ArgumentNullException.ThrowIfNull(grid);
        ArgumentNullException.ThrowIfNull(plan);
        var places = new (string Code, int Place)[grid.BandCount];
        for (var b = 0; b < places.Length; b++)
        {
            var band = plan.ById(grid.BandIds[b]) ?? throw new ArgumentException($"No band has identity {grid.BandIds[b]}.", nameof(plan));
            places[b] = (band.Code, b);
        }

        Array.Sort(places, (a, b) => string.CompareOrdinal(a.Code, b.Code));
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        Span<byte> record = stackalloc byte[1 + (CellGrid.QuantityCount * sizeof(int))];
        foreach (var (code, band) in places)
        {
            var any = false;
            for (var hour = 0; hour < CellGrid.Hours; hour++)
            {
                if (!grid.Has(hour, band))
                {
                    continue;
                }

                if (!any)
                {
                    hash.AppendData(Encoding.UTF8.GetBytes(code + "\n"));
                    any = true;
                }

                record[0] = (byte)hour;
                for (var quantity = 0; quantity < CellGrid.QuantityCount; quantity++)
                {
                    BinaryPrimitives.WriteInt32LittleEndian(record[(1 + (quantity * sizeof(int)))..], grid[(Quantity)quantity, hour, band]);
                }

                hash.AppendData(record);
            }
        }

        return Convert.ToHexStringLower(hash.GetHashAndReset().AsSpan(0, Length / 2));
    }
}
