using System.Buffers.Binary;

namespace Bandtide.Core.Packing;

/// <summary>Reads what <see cref="PackWriter"/> wrote; every read checks that the bytes are there.</summary>
internal ref struct PackReader(ReadOnlySpan<byte> bytes)
{
    private ReadOnlySpan<byte> rest = bytes;

    public readonly int Remaining => rest.Length;

    public byte Byte() => Take(1)[0];

    public short Int16() => BinaryPrimitives.ReadInt16LittleEndian(Take(2));

    public int Int32() => BinaryPrimitives.ReadInt32LittleEndian(Take(4));

    /// <summary>A number that is not negative.</summary>
    /// <exception cref="PackException">No such number stands here.</exception>
    public int Count()
    {
        var value = Varying();
        return value <= int.MaxValue ? (int)value : throw new PackException("a count is too large");
    }

    /// <summary>Any number.</summary>
    /// <exception cref="PackException">No number stands here.</exception>
    public int Signed()
    {
        var value = Varying();
        return (int)(value >> 1) ^ -(int)(value & 1);
    }

    /// <exception cref="PackException">Fewer bytes are left.</exception>
    public ReadOnlySpan<byte> Take(int count) => TakeOpen(count)[..count];

    /// <summary>Takes bytes and shows what follows them too: at least so many, for reads that look further than they use.</summary>
    /// <exception cref="PackException">Fewer bytes are left.</exception>
    public ReadOnlySpan<byte> TakeOpen(int count)
    {
        if ((uint)count > (uint)rest.Length)
        {
            throw new PackException("the bytes end too early");
        }

        var taken = rest;
        rest = rest[count..];
        return taken;
    }

    private uint Varying()
    {
        var value = 0uL;
        for (var shift = 0; shift < 35; shift += 7)
        {
            ulong part = Byte();
            value |= (part & 0x7F) << shift;
            if (part < 0x80)
            {
                return value <= uint.MaxValue ? (uint)value : throw new PackException("a number is too large");
            }
        }

        throw new PackException("a number is too long");
    }
}
