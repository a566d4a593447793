using Bandtide.Core.Packing;

namespace Bandtide.Core.Sheets;

/// <summary>The packed form of a sheet's cells: what a store keeps.</summary>
/// <remarks>
/// Version 1: version, number of bands, band identities; which cells exist (nothing when all do); which quantities exist;
/// per quantity which of the cells have it (nothing when all do) and the values of those in hour-major order as one
/// <see cref="BitPlane"/>. <c>level</c> is stored as its distance from <c>floor</c> and <c>level_p90</c> as its distance
/// from <c>level</c> where both exist. A CRC-32C of everything stands at the end and is checked before anything is read.
/// </remarks>
public static class SheetCodec
{
    private const byte Version = 1;
    private const int ChecksumLength = 4;

    // A reference comes before what leans on it.
    private static readonly Quantity[] Order =
    [
        Quantity.Sweeps, Quantity.Occupancy, Quantity.Floor, Quantity.Level, Quantity.LevelP90, Quantity.Signal,
        Quantity.Steady, Quantity.Coverage,
    ];

    /// <summary>All quantities, for <see cref="Decode(ReadOnlySpan{byte})"/>.</summary>
    public static IReadOnlyList<Quantity> All { get; } = Enum.GetValues<Quantity>();

    /// <summary>Packs a grid.</summary>
    public static byte[] Encode(CellGrid grid)
    {
        ArgumentNullException.ThrowIfNull(grid);
        var writer = new PackWriter(4096);
        writer.Byte(Version);
        writer.Int16((short)grid.BandCount);
        foreach (var id in grid.BandIds)
        {
            writer.Int16(id);
        }

        var sweeps = grid.Plane(Quantity.Sweeps);
        var cells = new int[grid.Count];
        for (int i = 0, n = 0; i < sweeps.Length; i++)
        {
            if (sweeps[i] != CellGrid.Missing)
            {
                cells[n++] = i;
            }
        }

        WriteMask(writer, sweeps.Length, cells);
        var present = Order.Where(quantity => !grid.Plane(quantity).IsEmpty).ToArray();
        writer.Byte(present.Aggregate(0, (mask, quantity) => mask | (1 << (int)quantity)));
        var values = new int[cells.Length];
        var having = new int[cells.Length];
        foreach (var quantity in present)
        {
            var plane = grid.Plane(quantity);
            var reference = ReferencePlane(grid, quantity);
            var count = 0;
            for (var n = 0; n < cells.Length; n++)
            {
                var i = cells[n];
                if (plane[i] != CellGrid.Missing)
                {
                    having[count] = n;
                    values[count++] = plane[i] - ReferenceValue(reference, i);
                }
            }

            WriteMask(writer, cells.Length, having.AsSpan(0, count));
            BitPlane.Write(writer, values.AsSpan(0, count));
        }

        writer.UInt32(Crc32C.Of(writer.Written));
        return writer.Written.ToArray();
    }

    /// <summary>Unpacks all quantities.</summary>
    /// <exception cref="SheetCorruptException">The bytes are not what <see cref="Encode"/> wrote.</exception>
    public static CellGrid Decode(ReadOnlySpan<byte> packed)
    {
        if (packed.Length < ChecksumLength + 5)
        {
            throw new SheetCorruptException($"The packed sheet is corrupt: {packed.Length} bytes are too few.");
        }

        if (packed[0] != Version)
        {
            throw new SheetCorruptException($"The packed sheet has format version {packed[0]}; this program reads {Version}.");
        }

        var body = packed[..^ChecksumLength];
        if (Crc32C.Of(body) != BitConverter.ToUInt32(packed[^ChecksumLength..]))
        {
            throw new SheetCorruptException("The packed sheet is corrupt: its checksum does not match.");
        }

        try
        {
            return Read(body[1..]);
        }
        catch (Exception e) when (e is PackException or ArgumentException)
        {
            throw new SheetCorruptException($"The packed sheet is corrupt: {e.Message}.", e);
        }
    }

    private static CellGrid Read(ReadOnlySpan<byte> body)
    {
        var reader = new PackReader(body);
        var bandIds = new short[Math.Max((short)0, reader.Int16())];
        for (var b = 0; b < bandIds.Length; b++)
        {
            bandIds[b] = reader.Int16();
        }

        var size = CellGrid.Hours * bandIds.Length;
        var cells = ReadMask(ref reader, size);
        int present = reader.Byte();
        var planes = new int[]?[CellGrid.QuantityCount];
        var values = new int[cells.Length];
        foreach (var quantity in Order.Where(quantity => (present & (1 << (int)quantity)) != 0))
        {
            var having = ReadMask(ref reader, cells.Length);
            var block = values.AsSpan(0, having.Length);
            BitPlane.Read(ref reader, block);
            var plane = new int[size];
            plane.AsSpan().Fill(CellGrid.Missing);
            planes[(int)quantity] = plane;
            var reference = quantity switch
            {
                Quantity.Level => planes[(int)Quantity.Floor],
                Quantity.LevelP90 => planes[(int)Quantity.Level],
                _ => null,
            };
            for (var n = 0; n < having.Length; n++)
            {
                var i = cells[having[n]];
                plane[i] = unchecked(block[n] + ReferenceValue(reference, i));
            }
        }

        return reader.Remaining == 0 ? new(bandIds, planes) : throw new PackException("bytes are left over");
    }

    private static ReadOnlySpan<int> ReferencePlane(CellGrid grid, Quantity quantity) => quantity switch
    {
        Quantity.Level => grid.Plane(Quantity.Floor),
        Quantity.LevelP90 => grid.Plane(Quantity.Level),
        _ => default,
    };

    private static int ReferenceValue(ReadOnlySpan<int> reference, int i) =>
        reference.IsEmpty || reference[i] == CellGrid.Missing ? 0 : reference[i];

    private static void WriteMask(PackWriter writer, int size, ReadOnlySpan<int> set)
    {
        writer.Byte(set.Length == size ? 1 : 0);
        if (set.Length == size)
        {
            return;
        }

        var bits = writer.Reserve((size + 7) / 8);
        foreach (var i in set)
        {
            bits[i >> 3] |= (byte)(1 << (i & 7));
        }
    }

    private static int[] ReadMask(ref PackReader reader, int size)
    {
        if (reader.Byte() == 1)
        {
            return [.. Enumerable.Range(0, size)];
        }

        var bits = reader.Take((size + 7) / 8);
        var set = new List<int>(size);
        for (var i = 0; i < size; i++)
        {
            if ((bits[i >> 3] & (1 << (i & 7))) != 0)
            {
                set.Add(i);
            }
        }

        return [.. set];
    }
}
