using System.Buffers.Binary;
using System.Numerics;
using Bandtide.Core.Bands;
using Bandtide.Core.Packing;
using Bandtide.Core.Sheets;
using CsCheck;

namespace Bandtide.Core.Tests.Sheets;

public sealed class SheetCodecTests
{
    [Fact]
    public void Reading_back_gives_what_was_packed() =>
        SheetSamples.Grid.Sample(grid => Assert.True(SheetSamples.Same(grid, SheetCodec.Decode(SheetCodec.Encode(grid)))));

    [Fact]
    public void Every_changed_byte_is_detected() =>
        Gen.Select(SheetSamples.Grid, Gen.Int, Gen.Int[1, 255]).Sample((grid, at, change) =>
        {
            var packed = SheetCodec.Encode(grid);
            packed[(int)((uint)at % packed.Length)] ^= (byte)change;
            Assert.Throws<SheetCorruptException>(() => SheetCodec.Decode(packed));
        });

    [Fact]
    public void Every_changed_bit_of_a_sheet_is_detected() => SheetSamples.Grid.Sample(grid =>
    {
        var packed = SheetCodec.Encode(grid);
        for (var bit = 0; bit < 8 * packed.Length; bit++)
        {
            packed[bit / 8] ^= (byte)(1 << (bit % 8));
            Assert.Throws<SheetCorruptException>(() => SheetCodec.Decode(packed));
            packed[bit / 8] ^= (byte)(1 << (bit % 8));
        }

        Assert.Equal(SheetCodec.Encode(SheetCodec.Decode(packed)), packed);
    }, iter: 20);

    // Bytes that the checksum vouches for and that no program of ours wrote: nothing but the one exception may come out.
    [Fact]
    public void Wrong_bytes_under_a_right_checksum_are_told_or_give_a_whole_grid() =>
        Gen.Select(SheetSamples.Grid, Gen.Select(Gen.Int, Gen.Byte).Array[1, 3]).Sample((grid, changes) =>
        {
            var packed = SheetCodec.Encode(grid);
            foreach (var (at, value) in changes)
            {
                packed[1 + (int)((uint)at % (packed.Length - 5))] = value;
            }

            BinaryPrimitives.WriteUInt32LittleEndian(packed.AsSpan(^4), Crc32C.Of(packed.AsSpan(..^4)));
            try
            {
                var read = SheetCodec.Decode(packed);
                Assert.Equal(CellGrid.Hours * read.BandCount, read.Plane(Quantity.Occupancy).Length);
                Assert.Equal(read.Count, read.Plane(Quantity.Occupancy).ToArray().Count(value => value != CellGrid.Missing));
            }
            catch (SheetCorruptException e)
            {
                Assert.StartsWith("The packed sheet", e.Message, StringComparison.Ordinal);
            }
        }, iter: 4_000);

    [Fact]
    public void Some_quantities_read_alone_equal_those_read_with_all() =>
        Gen.Select(SheetSamples.Grid, Gen.Enum<Quantity>().Array[0, 4]).Sample((grid, quantities) =>
        {
            var read = SheetCodec.Decode(SheetCodec.Encode(grid), quantities);
            Assert.True(read.BandIds.SequenceEqual(grid.BandIds));
            Assert.All(quantities.Append(Quantity.Sweeps).Append(Quantity.Occupancy), quantity => Assert.Equal(grid.Plane(quantity), read.Plane(quantity)));
        });

    [Fact]
    public void A_quantity_that_is_not_wanted_is_not_unpacked()
    {
        var grid = SheetSamples.Full(BandPlan.Standard.All.Take(40), new Random(1));
        var read = SheetCodec.Decode(SheetCodec.Encode(grid), Quantity.Floor);
        Assert.Equal(grid.Plane(Quantity.Floor), read.Plane(Quantity.Floor));
        Assert.All([Quantity.Signal, Quantity.Level, Quantity.LevelP90, Quantity.Steady, Quantity.Coverage], quantity => Assert.True(read.Plane(quantity).IsEmpty));
    }

    [Fact]
    public void Whole_days_of_forty_bands_survive() => Gen.Int.Sample(seed =>
    {
        var grid = SheetSamples.Full(BandPlan.Standard.All.Skip(seed & 15).Take(40), new Random(seed));
        Assert.True(SheetSamples.Same(grid, SheetCodec.Decode(SheetCodec.Encode(grid))));
    });

    // What a store of version 1 holds must stay readable: one cell of the contract's own example, as first written.
    [Fact]
    public void Bytes_packed_by_version_1_stay_readable()
    {
        var packed = Convert.FromHexString("01010C0101200000FF060000A00B0000060000B0430000070000DF99010000060000CC0300000600009E280000060000E77A000006000090030000070000A09C0100008535134F");
        var grid = SheetCodec.Decode(packed);
        Assert.Equal([720, 4312, -7860, -9610, -7035, -9840, 200, 10000], Enum.GetValues<Quantity>().Select(quantity => grid[quantity, 5, 0]));
        Assert.Equal((1, 1 << 5), (grid.Count, grid.HoursMask()));
    }

    [Theory]
    [InlineData(0, "format version 9")]
    [InlineData(20, "checksum")]
    public void The_exception_names_what_is_wrong(int at, string told)
    {
        var packed = SheetCodec.Encode(SheetSamples.Full(BandPlan.Standard.All.Take(3), new Random(1)));
        packed[at] = (byte)(at == 0 ? 9 : packed[at] ^ 1);
        Assert.Contains(told, Assert.Throws<SheetCorruptException>(() => SheetCodec.Decode(packed)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Cut_bytes_are_detected() =>
        Gen.Select(SheetSamples.Grid, Gen.Int).Sample((grid, at) =>
        {
            var packed = SheetCodec.Encode(grid);
            Assert.Throws<SheetCorruptException>(() => SheetCodec.Decode(packed.AsSpan(0, (int)((uint)at % packed.Length))));
        });

    [Fact]
    public void Any_bytes_either_decode_or_say_that_they_are_corrupt() =>
        Gen.Byte.Array[0, 200].Sample(bytes => Assert.Throws<SheetCorruptException>(() => SheetCodec.Decode(bytes)));

    [Fact]
    public void A_plane_of_any_numbers_within_32_bits_survives_packing() =>
        Gen.Select(Gen.Int[-1_000_000_000, 1_000_000_000], Gen.Int[0, 31]).SelectMany((least, width) =>
            Gen.Long[0, (1L << width) - 1].Select(offset => (int)Math.Min(int.MaxValue, least + offset)).Array[0, 200]).Sample(values =>
        {
            var writer = new PackWriter();
            BitPlane.Write(writer, values);
            var reader = new PackReader(writer.Written);
            var read = new int[values.Length];
            BitPlane.Read(ref reader, read);
            Assert.Equal(values, read);
            Assert.Equal(0, reader.Remaining);
        });

    // Against the plain definition: difference number n stands at bits n * width and following, least significant first.
    [Fact]
    public void Differences_stand_one_behind_the_other() =>
        Gen.Int[0, 32].SelectMany(width => Gen.Select(Gen.Const(width), Gen.Long[0, (1L << width) - 1].Array[1, 60], Gen.Int)).Sample((width, differences, least) =>
        {
            var values = differences.Select(difference => unchecked(least + (int)difference)).ToArray();
            var packed = new byte[BitPlane.ByteCount(values.Length, width) + 20];
            BitPlane.Pack(packed.AsSpan(0, packed.Length - 20), values, least, width);
            var bits = new BigInteger(packed, isUnsigned: true);
            Assert.Equal(differences, Enumerable.Range(0, values.Length).Select(n => (long)((bits >> (n * width)) & ((BigInteger.One << width) - 1))));
            var read = new int[values.Length];
            foreach (var behind in new[] { 0, 1, 20 })
            {
                BitPlane.Unpack(packed.AsSpan(0, packed.Length - 20 + behind), read, least, width);
                Assert.Equal(values, read);
            }
        });

    // RFC 3720 appendix B.4, "CRC Examples": 32 bytes of zeroes give aa 36 91 8a in transmission order, 32 of ones 43 ab a8 62.
    [Fact]
    public void The_checksum_is_crc32c()
    {
        Assert.Equal(0x8A9136AAu, Crc32C.Of(new byte[32]));
        Assert.Equal(0x62A8AB43u, Crc32C.Of([.. Enumerable.Repeat((byte)0xFF, 32)]));
    }

    [Fact]
    public void The_checksum_of_cells_changes_with_any_value_and_only_then() =>
        Gen.Select(SheetSamples.Grid, SheetSamples.Grid).Sample((a, b) =>
            Assert.Equal(SheetSamples.Same(a, b), string.Equals(SheetChecksum.Compute(a, BandPlan.Standard), SheetChecksum.Compute(b, BandPlan.Standard), StringComparison.Ordinal)));

    [Fact]
    public void The_checksum_of_cells_tells_one_changed_value() =>
        Gen.Select(SheetSamples.Grid, Gen.Int, Gen.Enum<Quantity>()).Sample((grid, at, quantity) =>
        {
            var planes = Enum.GetValues<Quantity>().Select(q => grid.Plane(q).IsEmpty ? null : grid.Plane(q).ToArray()).ToArray();
            var before = SheetChecksum.Compute(grid, BandPlan.Standard);
            Assert.Equal(before, SheetChecksum.Compute(new(grid.BandIds.ToArray(), planes), BandPlan.Standard));
            if (planes[(int)quantity] is { } plane && plane[(uint)at % plane.Length] != CellGrid.Missing)
            {
                plane[(uint)at % plane.Length]++;
                Assert.NotEqual(before, SheetChecksum.Compute(new(grid.BandIds.ToArray(), planes), BandPlan.Standard));
            }
        });

    [Fact]
    public void The_checksum_of_cells_is_32_hexadecimal_digits() => SheetSamples.Grid.Sample(grid =>
        Assert.Matches("^[0-9a-f]{32}$", SheetChecksum.Compute(grid, BandPlan.Standard)));
}
