using System.Buffers.Binary;

namespace Bandtide.Core.Packing;

/// <summary>
/// Bit packing of whole numbers by frame of reference: each block of values is stored as its least value and the
/// differences from it in as many bits as the largest one needs (none for a constant block).
/// </summary>
/// <remarks>
/// A difference is read from one unaligned 64-bit word, so widths up to 32 bits cost one load, shift and mask each.
/// Layout of a block: width (1 byte), least value (4 bytes), differences, least significant bit first, padded to a byte.
/// </remarks>
internal static class BitPlane
{
    /// <summary>Writes a block of values; the differences between them must fit in 32 bits.</summary>
    public static void Write(PackWriter writer, ReadOnlySpan<int> values)
    {
        var (least, largest) = (int.MaxValue, int.MinValue);
        foreach (var value in values)
        {
            least = Math.Min(least, value);
            largest = Math.Max(largest, value);
        }

        if (values.IsEmpty)
        {
            (least, largest) = (0, 0);
        }

        var width = 32 - int.LeadingZeroCount(unchecked(largest - least));
        writer.Byte(width);
        writer.Int32(least);
        var target = writer.Reserve(ByteCount(values.Length, width));
        ulong pending = 0;
        var (bits, place) = (0, 0);
        foreach (var value in values)
        {
            pending |= (ulong)unchecked((uint)(value - least)) << bits;
            bits += width;
            while (bits >= 8)
            {
                target[place++] = (byte)pending;
                pending >>= 8;
                bits -= 8;
            }
        }

        if (bits > 0)
        {
            target[place] = (byte)pending;
        }
    }

    /// <summary>Reads a block of as many values as the target holds.</summary>
    /// <exception cref="PackException">The bytes cannot be such a block.</exception>
    public static void Read(ref PackReader reader, Span<int> target)
    {
        int width = reader.Byte();
        if (width > 32)
        {
            throw new PackException($"a width of {width} bits is impossible");
        }

        var least = reader.Int32();
        var bytes = reader.Take(ByteCount(target.Length, width));
        if (width == 0)
        {
            target.Fill(least);
            return;
        }

        var mask = width == 32 ? uint.MaxValue : (1u << width) - 1;
        var i = 0;
        for (; i < target.Length; i++)
        {
            var bit = (long)i * width;
            var start = (int)(bit >> 3);
            if (start + 8 > bytes.Length)
            {
                break;
            }

            var word = BinaryPrimitives.ReadUInt64LittleEndian(bytes[start..]);
            target[i] = unchecked(least + (int)((uint)(word >> (int)(bit & 7)) & mask));
        }

        Span<byte> tail = stackalloc byte[16];
        for (; i < target.Length; i++)
        {
            var bit = (long)i * width;
            var start = (int)(bit >> 3);
            tail.Clear();
            bytes[start..].CopyTo(tail);
            var word = BinaryPrimitives.ReadUInt64LittleEndian(tail);
            target[i] = unchecked(least + (int)((uint)(word >> (int)(bit & 7)) & mask));
        }
    }

    private static int ByteCount(int values, int width) => (values * width + 7) / 8;
}
