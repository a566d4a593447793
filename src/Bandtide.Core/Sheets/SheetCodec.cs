using System.Buffers.Binary;
using Bandtide.Core.Packing;

namespace Bandtide.Core.Sheets;

/// <summary>The packed form of a sheet's cells: what a store keeps.</summary>
/// <remarks>
/// A version byte, the body in that version's format, and a CRC-32C of both, checked before anything is read. What was
/// packed by an earlier version stays readable: a new format gets the next version and its own class beside
/// <see cref="SheetFormat1"/>, and <see cref="Encode"/> writes the newest.
/// </remarks>
public static class SheetCodec
{
    private const int ChecksumLength = sizeof(uint);

    /// <summary>Packs a grid.</summary>
    public static byte[] Encode(CellGrid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        var writer = new PackWriter(4096);
        writer.Byte(SheetFormat1.Version);
        SheetFormat1.Write(writer, grid);
        writer.UInt32(Crc32C.Of(writer.Written));
        return writer.Written.ToArray();
    }

    /// <summary>Unpacks all quantities.</summary>
    /// <exception cref="SheetCorruptException">The bytes are not what <see cref="Encode"/> wrote.</exception>
    public static CellGrid Decode(ReadOnlySpan<byte> packed) => Decode(packed, (1 << CellGrid.QuantityCount) - 1);

    /// <summary>Unpacks some quantities, which takes less time; the other planes of the grid are empty.</summary>
    /// <param name="packed">What <see cref="Encode"/> wrote.</param>
    /// <param name="quantities">The quantities wanted; sweeps and occupancy are there always, and what the wanted ones lean on may be.</param>
    /// <exception cref="SheetCorruptException">The bytes are not what <see cref="Encode"/> wrote.</exception>
    public static CellGrid Decode(ReadOnlySpan<byte> packed, params ReadOnlySpan<Quantity> quantities)
    {
        var wanted = 0;
        foreach (var quantity in quantities)
        {
            wanted |= 1 << (int)quantity;
        }

        return Decode(packed, wanted);
    }

    private static CellGrid Decode(ReadOnlySpan<byte> packed, int wanted)
    {
        if (packed.Length <= ChecksumLength)
        {
            throw new SheetCorruptException($"The packed sheet is corrupt: {packed.Length} bytes are too few.");
        }

        if (packed[0] != SheetFormat1.Version)
        {
            throw new SheetCorruptException($"The packed sheet has format version {packed[0]}; this program reads {SheetFormat1.Version}.");
        }

        var body = packed[..^ChecksumLength];
        if (Crc32C.Of(body) != BinaryPrimitives.ReadUInt32LittleEndian(packed[^ChecksumLength..]))
        {
            throw new SheetCorruptException("The packed sheet is corrupt: its checksum does not match.");
        }

        try
        {
            return SheetFormat1.Read(body[1..], wanted);
        }
        catch (PackException e)
        {
            throw new SheetCorruptException($"The packed sheet is corrupt: {e.Message}.", e);
        }
    }
}
