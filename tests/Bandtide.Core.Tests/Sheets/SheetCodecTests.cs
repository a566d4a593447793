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
}
