using Bandtide.Core.Heatmaps;
using Bandtide.Core.Tiles;
using Bandtide.Storage.Heatmaps;

namespace Bandtide.Storage.Tests.Heatmaps;

public sealed class TileCacheTests
{
    private const Measure Shown = Measure.Occupancy;

    // One band: 24 cells of five bytes, and 200 for the entry.
    private const int TileBytes = 320;

    [Fact]
    public void What_was_read_at_a_state_is_gone_at_the_next()
    {
        var cache = new TileCache(1_000_000);
        var june = cache.At(6, Shown, 1);
        cache.Add(6, Shown, june, 1, Tile());
        cache.Add(6, Shown, june, 2, null);

        Assert.True(cache.At(6, Shown, 1).TryGet(1, out var tile));
        Assert.NotNull(tile);
        Assert.True(cache.At(6, Shown, 1).TryGet(2, out tile));
        Assert.Null(tile);
        Assert.False(cache.At(6, Measure.Level, 1).TryGet(1, out _));
        Assert.False(cache.At(6, Shown, 2).TryGet(1, out _));
    }

    [Fact]
    public void A_reader_that_is_behind_does_not_throw_out_what_is_newer()
    {
        var cache = new TileCache(1_000_000);
        cache.Add(6, Shown, cache.At(6, Shown, 5), 1, Tile());

        var behind = cache.At(6, Shown, 4);
        Assert.False(behind.TryGet(1, out _));
        cache.Add(6, Shown, behind, 2, Tile());

        Assert.True(cache.At(6, Shown, 5).TryGet(1, out _));
        Assert.False(cache.At(6, Shown, 5).TryGet(2, out _));
    }

    [Fact]
    public void The_month_that_was_used_longest_ago_leaves_first()
    {
        var cache = new TileCache(2 * TileBytes);
        cache.Add(1, Shown, cache.At(1, Shown, 1), 1, Tile());
        cache.Add(2, Shown, cache.At(2, Shown, 1), 1, Tile());
        cache.At(1, Shown, 1);

        cache.Add(3, Shown, cache.At(3, Shown, 1), 1, Tile());

        Assert.True(cache.At(1, Shown, 1).TryGet(1, out _));
        Assert.True(cache.At(3, Shown, 1).TryGet(1, out _));
        Assert.False(cache.At(2, Shown, 1).TryGet(1, out _));
    }

    private static MonthTile Tile() => new([1], new byte[24], new int[24]);
}
