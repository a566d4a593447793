using System.Numerics;
using Bandtide.Core.Packing;

namespace Bandtide.Core.Sheets;

/// <summary>Version 1 of the packed sheet.</summary>
/// <remarks>
/// <list type="number">
/// <item>Band identities as runs of neighbours: number of runs, then for each the gap since the last and its length.</item>
/// <item>The cells that exist, as <see cref="HourMasks"/>.</item>
/// <item>The quantities that exist, one bit each.</item>
/// <item>Per quantity, in the order of <see cref="Order"/>, a section with its length before it, so that it can be passed over:
/// which cells have a value (<see cref="HourMasks"/>), the least value and the bits of a difference per band
/// (<see cref="BitPlane"/>), and per band the differences by hour, padded to a byte.</item>
/// </list>
/// <c>level</c> is stored as its distance from <c>floor</c> and <c>level_p90</c> as its distance from <c>level</c> where both
/// exist. Blocks are by band since a band's values differ less over a day than those of an hour do over the bands.
/// </remarks>
internal static class SheetFormat1
{
    public const byte Version = 1;

    private const int Always = (1 << (int)Quantity.Sweeps) | (1 << (int)Quantity.Occupancy);

    // A reference comes before what leans on it.
    private static readonly Quantity[] Order =
    [
        Quantity.Sweeps, Quantity.Occupancy, Quantity.Floor, Quantity.Level, Quantity.LevelP90, Quantity.Signal,
        Quantity.Steady, Quantity.Coverage,
    ];

    public static void Write(PackWriter writer, CellGrid grid)
    {
        WriteBands(writer, grid.BandIds);
        var (all, cells, masks) = (new int[grid.BandCount], new int[grid.BandCount], new int[grid.BandCount]);
        Array.Fill(all, HourMasks.AllHours);
        HourMasks.Of(grid.Plane(Quantity.Sweeps), cells);
        HourMasks.Write(writer, cells, all);
        var present = Order.Where(quantity => !grid.Plane(quantity).IsEmpty).ToArray();
        writer.Byte(present.Aggregate(0, (bits, quantity) => bits | (1 << (int)quantity)));
        var section = new PackWriter(2048);
        var scratch = new int[2 * CellGrid.Hours * grid.BandCount];
        foreach (var quantity in present)
        {
            section.Clear();
            HourMasks.Of(grid.Plane(quantity), masks);
            HourMasks.Write(section, masks, cells);
            grid.Plane(quantity).CopyTo(scratch);
            Distances.Subtract(scratch.AsSpan(0, scratch.Length / 2), ReferenceOf(quantity) is { } other ? grid.Plane(other) : default);
            WritePlane(section, scratch.AsSpan(0, scratch.Length / 2), scratch.AsSpan(scratch.Length / 2), masks);
            writer.Section(section);
        }
    }

    public static CellGrid Read(ReadOnlySpan<byte> body, int wanted)
    {
        var reader = new PackReader(body);
        var bandIds = ReadBands(ref reader);
        var (all, cells, masks) = (new int[bandIds.Length], new int[bandIds.Length], new int[bandIds.Length]);
        Array.Fill(all, HourMasks.AllHours);
        HourMasks.Read(ref reader, cells, all);
        int present = reader.Byte();
        if ((present & Always) != Always)
        {
            throw new PackException("sweeps or occupancy is not there");
        }

        var needed = Needed(wanted) & present;
        var planes = new int[]?[CellGrid.QuantityCount];
        foreach (var quantity in Order)
        {
            if ((present & (1 << (int)quantity)) == 0)
            {
                continue;
            }

            var section = reader.Take(reader.Count());
            if ((needed & (1 << (int)quantity)) != 0)
            {
                var other = ReferenceOf(quantity) is { } reference ? planes[(int)reference] : null;
                planes[(int)quantity] = ReadSection(section, cells, masks, other, isComplete: quantity <= Quantity.Occupancy);
            }
        }

        return reader.Remaining == 0 ? new(bandIds, planes) : throw new PackException("bytes are left over");
    }

    private static Quantity? ReferenceOf(Quantity quantity) => quantity switch
    {
        Quantity.Level => Quantity.Floor,
        Quantity.LevelP90 => Quantity.Level,
        _ => null,
    };

    private static int Needed(int wanted)
    {
        var needed = wanted | Always;
        foreach (var quantity in Order.Reverse())
        {
            if ((needed & (1 << (int)quantity)) != 0 && ReferenceOf(quantity) is { } other)
            {
                needed |= 1 << (int)other;
            }
        }

        return needed;
    }

    // The values are gathered by band in a scratch as long as the plane.
    private static void WritePlane(PackWriter writer, ReadOnlySpan<int> distances, Span<int> values, ReadOnlySpan<int> masks)
    {
        var (least, widths) = (new int[masks.Length], new int[masks.Length]);
        var count = 0;
        for (var b = 0; b < masks.Length; b++)
        {
            var block = values.Slice(count, BitOperations.PopCount((uint)masks[b]));
            Gather(distances[b..], masks.Length, masks[b], block);
            count += block.Length;

            // A band without values repeats its neighbour, which costs nothing.
            (least[b], widths[b]) = block.IsEmpty && b > 0 ? (least[b - 1], 0) : BitPlane.Frame(block);
        }

        BitPlane.WriteSmall(writer, least);
        BitPlane.WriteSmall(writer, widths);
        count = 0;
        for (var b = 0; b < masks.Length; b++)
        {
            var block = values.Slice(count, BitOperations.PopCount((uint)masks[b]));
            BitPlane.Pack(writer.Reserve(BitPlane.ByteCount(block.Length, widths[b])), block, least[b], widths[b]);
            count += block.Length;
        }
    }

    private static int[] ReadSection(ReadOnlySpan<byte> bytes, ReadOnlySpan<int> cells, Span<int> masks, int[]? reference, bool isComplete)
    {
        var reader = new PackReader(bytes);
        HourMasks.Read(ref reader, masks, cells);
        if (isComplete && !masks.SequenceEqual(cells))
        {
            throw new PackException("a cell is without sweeps or occupancy");
        }

        var (least, widths) = (new int[masks.Length], new int[masks.Length]);
        BitPlane.ReadSmall(ref reader, least);
        BitPlane.ReadSmall(ref reader, widths);
        var plane = new int[CellGrid.Hours * masks.Length];
        if (masks.ContainsAnyExcept(HourMasks.AllHours))
        {
            plane.AsSpan().Fill(CellGrid.Missing);
        }

        Span<int> block = stackalloc int[CellGrid.Hours];
        for (var b = 0; b < masks.Length; b++)
        {
            var width = BitPlane.Checked(widths[b]);
            var values = block[..BitOperations.PopCount((uint)masks[b])];
            BitPlane.Unpack(reader.TakeOpen(BitPlane.ByteCount(values.Length, width)), values, least[b], width);
            Scatter(values, masks[b], plane.AsSpan(b), masks.Length);
        }

        Distances.Add(plane, reference);
        return reader.Remaining == 0 ? plane : throw new PackException("bytes are left over");
    }

    // The values of one band from their hours.
    private static void Gather(ReadOnlySpan<int> column, int stride, int mask, Span<int> values)
    {
        if (mask == HourMasks.AllHours)
        {
            for (int hour = 0, i = 0; hour < values.Length; hour++, i += stride)
            {
                values[hour] = column[i];
            }

            return;
        }

        for (var n = 0; mask != 0; mask &= mask - 1)
        {
            values[n++] = column[BitOperations.TrailingZeroCount(mask) * stride];
        }
    }

    // The values of one band to their hours.
    private static void Scatter(ReadOnlySpan<int> values, int mask, Span<int> column, int stride)
    {
        if (mask == HourMasks.AllHours)
        {
            for (int hour = 0, i = 0; hour < values.Length; hour++, i += stride)
            {
                column[i] = values[hour];
            }

            return;
        }

        for (var n = 0; mask != 0; mask &= mask - 1)
        {
            column[BitOperations.TrailingZeroCount(mask) * stride] = values[n++];
        }
    }

    private static void WriteBands(PackWriter writer, ReadOnlySpan<short> bandIds)
    {
        var runs = new List<(int Gap, int Length)>();
        for (var b = 0; b < bandIds.Length; b++)
        {
            var gap = bandIds[b] - (b == 0 ? 0 : bandIds[b - 1] + 1);
            if (b > 0 && gap == 0)
            {
                runs[^1] = (runs[^1].Gap, runs[^1].Length + 1);
            }
            else
            {
                runs.Add((gap, 1));
            }
        }

        writer.Count(runs.Count);
        foreach (var (gap, length) in runs)
        {
            writer.Signed(gap);
            writer.Count(length);
        }
    }

    private static short[] ReadBands(ref PackReader reader)
    {
        var bandIds = new List<short>();
        long next = 0;
        for (var runs = reader.Count(); runs > 0; runs--)
        {
            next += reader.Signed();
            var length = reader.Count();
            if (next < (bandIds.Count == 0 ? short.MinValue : bandIds[^1] + 1) || next + length - 1 > short.MaxValue)
            {
                throw new PackException("a band identity is impossible");
            }

            for (var end = next + length; next < end; next++)
            {
                bandIds.Add((short)next);
            }
        }

        return [.. bandIds];
    }
}
