using Bandtide.Core.Packing;

namespace Bandtide.Core.Tiles;

/// <summary>The packed form of a month tile: what a store keeps.</summary>
/// <remarks>
/// Version 1: version, number of bands, band identities, one <see cref="BitPlane"/> of days, one of sums, and a CRC-32C of it
/// all, checked before anything is read.
/// </remarks>
public static class MonthTileCodec
{
    private const byte Version = 1;
    private const int ChecksumLength = 4;

    /// <summary>Packs a tile. Equal tiles give equal bytes.</summary>
    public static byte[] Encode(MonthTile tile)
    {
        ArgumentNullException.ThrowIfNull(tile);
        var writer = new PackWriter(4096);
        writer.Byte(Version);
        writer.Int16((short)tile.BandCount);
        foreach (var id in tile.BandIds)
        {
            writer.Int16(id);
        }

        var days = new int[tile.Days.Length];
        for (var i = 0; i < days.Length; i++)
        {
            days[i] = tile.Days[i];
        }

        BitPlane.Write(writer, days);
        BitPlane.Write(writer, tile.Sums);
        writer.UInt32(Crc32C.Of(writer.Written));
        return writer.Written.ToArray();
    }

    /// <summary>Unpacks a tile.</summary>
    /// <exception cref="TileCorruptException">The bytes are not what <see cref="Encode"/> wrote.</exception>
    public static MonthTile Decode(ReadOnlySpan<byte> packed)
    {
        if (packed.Length < ChecksumLength + 3)
        {
            throw new TileCorruptException($"The packed tile is corrupt: {packed.Length} bytes are too few.");
        }

        if (packed[0] != Version)
        {
            throw new TileCorruptException($"The packed tile has format version {packed[0]}; this program reads {Version}.");
        }

        var body = packed[..^ChecksumLength];
        if (Crc32C.Of(body) != BitConverter.ToUInt32(packed[^ChecksumLength..]))
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
        }

        var plane = new int[24 * bandIds.Length];
        BitPlane.Read(ref reader, plane);
        var days = new byte[plane.Length];
        for (var i = 0; i < days.Length; i++)
        {
            days[i] = plane[i] is >= 0 and <= 31 ? (byte)plane[i] : throw new PackException($"a cell has {plane[i]} days in a month");
        }

        BitPlane.Read(ref reader, plane);
        return reader.Remaining == 0 ? new(bandIds, days, plane) : throw new PackException("bytes are left over");
    }
}
