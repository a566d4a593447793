using Bandtide.Core.Heatmaps;
using Bandtide.Core.Packing;
using Bandtide.Core.Tests.Sheets;
using Bandtide.Core.Tiles;
using CsCheck;

namespace Bandtide.Core.Tests.Tiles;

public sealed class MonthTileCodecTests
{
    private static readonly Gen<MonthTile> Tile =
        from ids in Gen.Short[1, 2000].HashSet[1, 70]
        from cells in Gen.Select(Gen.Int[0, 31], Gen.Int[-60_000, 60_000]).Array[24 * ids.Count]
        select new MonthTile(
            [.. ids.Order()], [.. cells.Select(cell => (byte)cell.Item1)], [.. cells.Select(cell => cell.Item1 * cell.Item2)]);

    [Fact]
    public void Reading_back_gives_what_was_packed() => Gen.OneOf(Tile, FromSheets).Sample(tile =>
    {
        var read = MonthTileCodec.Decode(MonthTileCodec.Encode(tile));
        Assert.Equal(tile.BandIds.ToArray(), read.BandIds.ToArray());
        Assert.Equal(tile.Days.ToArray(), read.Days.ToArray());
        Assert.Equal(tile.Sums.ToArray(), read.Sums.ToArray());
    });

    [Fact]
    public void Every_changed_byte_is_detected() => Gen.Select(Tile, Gen.UInt, Gen.Int[1, 255]).Sample((tile, at, change) =>
    {
        var packed = MonthTileCodec.Encode(tile);
        packed[at % packed.Length] ^= (byte)change;
        Assert.Throws<TileCorruptException>(() => MonthTileCodec.Decode(packed));
    });

    [Fact]
    public void Cut_bytes_are_detected() => Gen.Select(Tile, Gen.UInt).Sample((tile, at) =>
    {
        var packed = MonthTileCodec.Encode(tile);
        Assert.Throws<TileCorruptException>(() => MonthTileCodec.Decode(packed.AsSpan(0, (int)(at % packed.Length))));
    });

    // The checksum put right, so that what is behind it has to be looked at.
    [Fact]
    public void Wrong_contents_with_a_right_checksum_are_detected_or_harmless() => Gen.Select(Gen.OneOf(Gen.Byte.Array[0, 300], Tile.Select(MonthTileCodec.Encode)), Gen.UInt, Gen.Byte).Sample(
        (bytes, at, value) =>
        {
            byte[] body = bytes.Length < 8 ? [1, .. bytes] : bytes[..^4];
            body[0] = 1;
            body[at % body.Length] = value;
            byte[] packed = [.. body, .. BitConverter.GetBytes(Crc32C.Of(body))];
            try
            {
                Assert.All(MonthTileCodec.Decode(packed).Days.ToArray(), days => Assert.InRange(days, 0, 31));
            }
            catch (TileCorruptException e)
            {
                Assert.NotEmpty(e.Message);
            }
        });

    [Fact]
    public void A_newer_format_is_named()
    {
        var packed = MonthTileCodec.Encode(new([1], new byte[24], new int[24]));
        packed[0] = 9;
        Assert.Contains("version 9", Assert.Throws<TileCorruptException>(() => MonthTileCodec.Decode(packed)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_month_without_gaps_takes_no_bits_for_its_days()
    {
        var full = new MonthTile([1, 2], [.. Enumerable.Repeat((byte)30, 48)], new int[48]);
        Assert.True(MonthTileCodec.Encode(full).Length < 30, $"{MonthTileCodec.Encode(full).Length} bytes");
    }

    private static Gen<MonthTile> FromSheets =>
        from sheets in SheetSamples.Grid.List[1, 5]
        select MonthTile.FromSheets(Measure.Occupancy, sheets)!;
}
