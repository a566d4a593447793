using System.Runtime.InteropServices;
using Bandtide.Core.Packing;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Tiles;

/// <summary>The packed form of a month tile: what a store keeps.</summary>
/// <remarks>
/// Version 1: version, number of bands, band identities, days of all cells, sums of the cells that have days, both as one
/// <see cref="BitPlane"/> in hour-major order (a month without a gap takes no bit for its days). A CRC-32C of everything stands at
/// the end and is checked before anything is read. Equal tiles give equal bytes.
/// </remarks>
public static class MonthTileCodec
{
    private const byte Version = 1;
    private const int ChecksumLength = 4;
    private const int MostDays = 31;

    /// <summary>Packs a tile.</summary>
    public static byte[] Encode(MonthTile tile)
    {
        ArgumentNullException.ThrowIfNull(tile);
        var writer = new PackWriter(3072);
        writer.Byte(Version);
        writer.Int16((short)tile.BandCount);
        foreach (var id in tile.BandIds)
        {
            writer.Int16(id);
        }

        var days = new int[tile.Days.Length];
        var sums = new int[days.Length];
        var count = 0;
        for (var i = 0; i < days.Length; i++)
        {
            days[i] = tile.Days[i];
            if (days[i] > 0)
            {
                sums[count++] = tile.Sums[i];
            }
        }

        BitPlane.Write(writer, days);
        BitPlane.Write(writer, sums.AsSpan(0, count));
        writer.UInt32(Crc32C.Of(writer.Written));
        return writer.Written.ToArray();
    }

    /// <summary>Unpacks a tile.</summary>
    /// <exception cref="TileCorruptException">The bytes are not what <see cref="Encode"/> wrote.</exception>
    public static MonthTile Decode(ReadOnlySpan<byte> packed)
    {
        if (packed.Length < ChecksumLength + 1)
        {
            throw new TileCorruptException($"The packed tile is corrupt: {packed.Length} bytes are too few.");
        }

        if (packed[0] != Version)
        {
            throw new TileCorruptException($"The packed tile has format version {packed[0]}; this program reads {Version}.");
        }

        var body = packed[..^ChecksumLength];
        if (Crc32C.Of(body) != MemoryMarshal.Read<uint>(packed[^ChecksumLength..]))
        {
            throw new TileCorruptException("The packed tile is corrupt: its checksum does not match.");
        }

        try
        {
            return Read(body[1..]);
        }
        catch (PackException e)
        {
            throw new TileCorruptException($"The packed tile is corrupt: {e.Message}.", e);
        }
    }

    private static MonthTile Read(ReadOnlySpan<byte> body)
    {
        var reader = new PackReader(body);
        var bandIds = new short[Math.Max((short)0, reader.Int16())];
        for (var b = 0; b < bandIds.Length; b++)
        {
            bandIds[b] = reader.Int16();
            if (b > 0 && bandIds[b] <= bandIds[b - 1])
            {
                throw new PackException("band identities do not ascend");
            }
        }

        var size = CellGrid.Hours * bandIds.Length;
        var sums = new int[size];
        BitPlane.Read(ref reader, sums);
        var days = new byte[size];
        var count = 0;
        for (var i = 0; i < size; i++)
        {
            if ((uint)sums[i] > MostDays)
            {
                throw new PackException($"{sums[i]} days in a month");
            }

            days[i] = (byte)sums[i];
            count += sums[i] == 0 ? 0 : 1;
        }

        ReadSums(ref reader, days, sums, count);
        return reader.Remaining == 0 ? new(bandIds, days, sums) : throw new PackException("bytes are left over");
    }

    // The sums of the cells that have days stand at the front at first; spread from behind, none is overwritten unread.
    private static void ReadSums(ref PackReader reader, byte[] days, int[] sums, int count)
    {
        BitPlane.Read(ref reader, sums.AsSpan(0, count));
        if (count == sums.Length)
        {
            return;
        }

        for (var i = sums.Length - 1; i >= 0; i--)
        {
            sums[i] = days[i] == 0 ? 0 : sums[--count];
        }
    }
}
