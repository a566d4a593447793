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

    /// <exception cref="PackException">Fewer bytes are left.</exception>
    public ReadOnlySpan<byte> Take(int count)
    {
        if ((uint)count > (uint)rest.Length)
        {
            throw new PackException("the bytes end too early");
        }

        var taken = rest[..count];
        rest = rest[count..];
        return taken;
    }
}
