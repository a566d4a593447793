using System.Buffers.Binary;
using System.Numerics;

namespace Bandtide.Core.Packing;

/// <summary>CRC-32C (Castagnoli; RFC 3720 appendix B.4), by the processor's instruction where it has one.</summary>
internal static class Crc32C
{
    public static uint Of(ReadOnlySpan<byte> bytes)
    {
        var crc = uint.MaxValue;
        for (; bytes.Length >= 8; bytes = bytes[8..])
        {
            crc = BitOperations.Crc32C(crc, BinaryPrimitives.ReadUInt64LittleEndian(bytes));
        }

        foreach (var value in bytes)
        {
            crc = BitOperations.Crc32C(crc, value);
        }

        return ~crc;
    }
}
