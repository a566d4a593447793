using System.Buffers.Binary;
using Bandtide.Core.Packing;

namespace Bandtide.Core.Sheets;

/// <summary>Which hours of each band have a value: 24 bits a band, bit <c>h</c> for hour <c>h</c>.</summary>
/// <remarks>One byte where nothing is missing, four where the same hours are missing in all bands, else three bytes a band.</remarks>
internal static class HourMasks
{
    /// <summary>All hours of a day.</summary>
    public const int AllHours = (1 << CellGrid.Hours) - 1;

    private const int Bytes = 3;
    private const byte AsAllowed = 0;
    private const byte Common = 1;
    private const byte PerBand = 2;

    /// <summary>The masks of a plane.</summary>
    public static void Of(ReadOnlySpan<int> plane, Span<int> masks)
    {
        if (!plane.Contains(CellGrid.Missing))
        {
            masks.Fill(AllHours);
            return;
        }

        masks.Clear();
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            var row = plane.Slice(hour * masks.Length, masks.Length);
            for (var b = 0; b < masks.Length; b++)
            {
                masks[b] |= (row[b] == CellGrid.Missing ? 0 : 1) << hour;
            }
        }
    }

    /// <summary>Writes masks, each being part of the one that is allowed for its band.</summary>
    public static void Write(PackWriter writer, ReadOnlySpan<int> masks, ReadOnlySpan<int> allowed)
    {
        if (masks.SequenceEqual(allowed))
        {
            writer.Byte(AsAllowed);
            return;
        }

        var common = !masks.ContainsAnyExcept(masks[0]);
        writer.Byte(common ? Common : PerBand);
        foreach (var mask in common ? masks[..1] : masks)
        {
            var bytes = writer.Reserve(Bytes);
            BinaryPrimitives.WriteUInt16LittleEndian(bytes, (ushort)mask);
            bytes[2] = (byte)(mask >> 16);
        }
    }

    /// <summary>Reads masks.</summary>
    /// <exception cref="PackException">They cannot be what was written.</exception>
    public static void Read(ref PackReader reader, Span<int> masks, ReadOnlySpan<int> allowed)
    {
        switch (reader.Byte())
        {
            case AsAllowed:
                allowed.CopyTo(masks);
                return;
            case Common:
                masks.Fill(One(ref reader));
                break;
            case PerBand:
                foreach (ref var mask in masks)
                {
                    mask = One(ref reader);
                }

                break;
            default:
                throw new PackException("a mask of unknown kind");
        }

        for (var b = 0; b < masks.Length; b++)
        {
            if ((masks[b] & ~allowed[b]) != 0)
            {
                throw new PackException("a value stands where no cell is");
            }
        }
    }

    private static int One(ref PackReader reader)
    {
        var bytes = reader.Take(Bytes);
        return bytes[0] | (bytes[1] << 8) | (bytes[2] << 16);
    }
}
