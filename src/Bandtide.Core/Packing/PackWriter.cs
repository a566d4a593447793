using System.Buffers.Binary;

namespace Bandtide.Core.Packing;

/// <summary>Appends little-endian values and bit-packed planes to a growing buffer.</summary>
internal sealed class PackWriter(int capacity = 1024)
{
    private byte[] buffer = new byte[capacity];

    public int Length { get; private set; }

    public ReadOnlySpan<byte> Written => buffer.AsSpan(0, Length);

    public void Byte(int value) => Reserve(1)[0] = checked((byte)value);

    public void Int16(short value) => BinaryPrimitives.WriteInt16LittleEndian(Reserve(2), value);

    public void Int32(int value) => BinaryPrimitives.WriteInt32LittleEndian(Reserve(4), value);

    public void UInt32(uint value) => BinaryPrimitives.WriteUInt32LittleEndian(Reserve(4), value);

    /// <summary>Writes a number that is not negative, seven bits a byte: small ones take one.</summary>
    public void Count(int value)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(value);
        Varying((uint)value);
    }

    /// <summary>Writes any number, seven bits a byte: those near 0 on either side take one.</summary>
    public void Signed(int value) => Varying((uint)((value << 1) ^ (value >> 31)));

    /// <summary>Writes what another writer holds, its length before it.</summary>
    public void Section(PackWriter section)
    {
        Count(section.Length);
        section.Written.CopyTo(Reserve(section.Length));
    }

    /// <summary>Begins anew in the same buffer.</summary>
    public void Clear()
    {
        buffer.AsSpan(0, Length).Clear();
        Length = 0;
    }

    /// <summary>A run of bytes to fill, all zero at first.</summary>
    public Span<byte> Reserve(int count)
    {
        if (Length + count > buffer.Length)
        {
            Array.Resize(ref buffer, Math.Max(buffer.Length * 2, Length + count));
        }

        Length += count;
        return buffer.AsSpan(Length - count, count);
    }

    private void Varying(uint value)
    {
        for (; value >= 0x80; value >>= 7)
        {
            Byte((int)(0x80 | (value & 0x7F)));
        }

        Byte((int)value);
    }
}
