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

    /// <summary>A number from 0 to 2^28 - 1, seven bits a byte.</summary>
    /// <exception cref="PackException">No such number stands here.</exception>
    public int Count()
    {
        var value = 0;
        for (var shift = 0; shift < 28; shift += 7)
        {
            int part = Byte();
            value |= (part & 0x7F) << shift;
            if (part < 0x80)
            {
                return value;
            }
        }

        throw new PackException("a count is too large");
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
}
