using System.Buffers.Binary;
using System.Numerics;

namespace Bandtide.Core.Packing;

/// <summary>
/// Bit packing of whole numbers by frame of reference: each block of values is stored as its least value and the
/// differences from it in as many bits as the largest one needs (none for a constant block).
/// </summary>
/// <remarks>
/// Layout of a block that describes itself (<see cref="Write"/>): width (1 byte), least value (4 bytes), differences,
/// least significant bit first, padded to a byte. <see cref="Pack"/> and <see cref="Unpack"/> do the differences alone,
/// for formats that keep widths and least values elsewhere.
/// </remarks>
internal static class BitPlane
{
    /// <summary>Most bits that a difference may take.</summary>
    public const int MaxWidth = 32;

    /// <summary>Writes a block of values; the differences between them must fit in 32 bits.</summary>
    public static void Write(PackWriter writer, ReadOnlySpan<int> values)
    {
        var (least, width) = Frame(values);
        writer.Byte(width);
        writer.Int32(least);
        Pack(writer.Reserve(ByteCount(values.Length, width)), values, least, width);
    }

    /// <summary>Reads a block of as many values as the target holds.</summary>
    /// <exception cref="PackException">The bytes cannot be such a block.</exception>
    public static void Read(ref PackReader reader, Span<int> target)
    {
        var width = Checked(reader.Byte());
        var least = reader.Int32();
        Unpack(reader.TakeOpen(ByteCount(target.Length, width)), target, least, width);
    }

    /// <summary>Writes a block as <see cref="Write"/> does, but its least value in fewer bytes where that is near 0.</summary>
    public static void WriteSmall(PackWriter writer, ReadOnlySpan<int> values)
    {
        var (least, width) = Frame(values);
        writer.Byte(width);
        writer.Signed(least);
        Pack(writer.Reserve(ByteCount(values.Length, width)), values, least, width);
    }

    /// <summary>Reads what <see cref="WriteSmall"/> wrote.</summary>
    /// <exception cref="PackException">The bytes cannot be such a block.</exception>
    public static void ReadSmall(ref PackReader reader, Span<int> target)
    {
        var width = Checked(reader.Byte());
        var least = reader.Signed();
        Unpack(reader.TakeOpen(ByteCount(target.Length, width)), target, least, width);
    }

    /// <summary>A width that was read.</summary>
    /// <exception cref="PackException">No difference is so wide.</exception>
    public static int Checked(int width) =>
        width is >= 0 and <= MaxWidth ? width : throw new PackException($"a width of {width} bits is impossible");

    /// <summary>Least value of a block and the bits that its differences need; both 0 for an empty one.</summary>
    public static (int Least, int Width) Frame(ReadOnlySpan<int> values)
    {
        if (values.IsEmpty)
        {
            return (0, 0);
        }

        var (least, largest) = (values[0], values[0]);
        if (values.Length >= Vector<int>.Count)
        {
            var (low, high) = (new Vector<int>(values), new Vector<int>(values));
            for (; values.Length >= Vector<int>.Count; values = values[Vector<int>.Count..])
            {
                var next = new Vector<int>(values);
                (low, high) = (Vector.Min(low, next), Vector.Max(high, next));
            }

            for (var lane = 0; lane < Vector<int>.Count; lane++)
            {
                (least, largest) = (Math.Min(least, low[lane]), Math.Max(largest, high[lane]));
            }
        }

        foreach (var value in values)
        {
            (least, largest) = (Math.Min(least, value), Math.Max(largest, value));
        }

        return (least, MaxWidth - int.LeadingZeroCount(unchecked(largest - least)));
    }

    /// <summary>Bytes that so many differences of a width take.</summary>
    public static int ByteCount(int values, int width) => (values * width + 7) / 8;

    /// <summary>Packs the differences of values from the least of them.</summary>
    /// <param name="target">Exactly <see cref="ByteCount"/> bytes.</param>
    /// <param name="values">The values.</param>
    /// <param name="least">Their least.</param>
    /// <param name="width">Bits of a difference, 0 to <see cref="MaxWidth"/>.</param>
    public static void Pack(Span<byte> target, ReadOnlySpan<int> values, int least, int width)
    {
        ulong pending = 0;
        var bits = 0;
        foreach (var value in values)
        {
            pending |= (ulong)unchecked((uint)(value - least)) << bits;
            bits += width;
            if (bits >= 32)
            {
                BinaryPrimitives.WriteUInt32LittleEndian(target, (uint)pending);
                target = target[4..];
                pending >>= 32;
                bits -= 32;
            }
        }

        for (; bits > 0; bits -= 8)
        {
            target[0] = (byte)pending;
            target = target[1..];
            pending >>= 8;
        }
    }

    /// <summary>Undoes <see cref="Pack"/>.</summary>
    /// <param name="source">At least <see cref="ByteCount"/> bytes; what follows them is not used, but lets more of them be read at once.</param>
    /// <param name="target">As many places as values were packed.</param>
    /// <param name="least">Least value of the block.</param>
    /// <param name="width">Bits of a difference, 0 to <see cref="MaxWidth"/>.</param>
    public static void Unpack(ReadOnlySpan<byte> source, Span<int> target, int least, int width)
    {
        if (width == 0)
        {
            target.Fill(least);
            return;
        }

        var done = BitLanes.Unpack(source, target, least, width);
        if (done < target.Length)
        {
            UnpackSingly(source, target, done, least, width);
        }
    }

    private static void UnpackSingly(ReadOnlySpan<byte> source, Span<int> target, int from, int least, int width)
    {
        var mask = width == MaxWidth ? uint.MaxValue : (1u << width) - 1;
        Span<byte> tail = stackalloc byte[sizeof(ulong)];
        for (var i = from; i < target.Length; i++)
        {
            var bit = i * width;
            var at = source[(bit >> 3)..];
            ulong word;
            if (at.Length >= tail.Length)
            {
                word = BinaryPrimitives.ReadUInt64LittleEndian(at);
            }
            else
            {
                tail.Clear();
                at.CopyTo(tail);
                word = BinaryPrimitives.ReadUInt64LittleEndian(tail);
            }

            target[i] = unchecked(least + (int)((uint)(word >> (bit & 7)) & mask));
        }
    }
}
