using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Tests.Sheets;
using Bandtide.Core.Tiles;
using CsCheck;

namespace Bandtide.Core.Tests.Tiles;

public sealed class MonthTileTests
{
    private static readonly Gen<List<CellGrid>> Sheets = SheetSamples.Grid.List[0, 8];

    [Fact]
    public void A_tile_holds_count_and_sum_of_every_measure() => Gen.Select(Gen.Enum<Measure>(), Sheets).Sample((measure, sheets) =>
    {
        var tile = MonthTile.FromSheets(measure, sheets);
        var cells = from sheet in sheets
                    from hour in Enumerable.Range(0, 24)
                    from band in Enumerable.Range(0, sheet.BandCount)
                    let value = Value(measure, sheet, hour, band)
                    where value is not null
                    select (Key: (sheet.BandIds[band], hour), value.Value);
        var expected = cells.ToLookup(cell => cell.Key, cell => cell.Value);

        Assert.Equal(expected.Count == 0, tile is null);
        Assert.Equal(expected.Select(cell => cell.Key.Item1).Distinct().Order(), tile is null ? [] : tile.BandIds.ToArray());
        for (var i = 0; i < (tile?.Days.Length ?? 0); i++)
        {
            var values = expected[(tile!.BandIds[i % tile.BandCount], i / tile.BandCount)].ToList();
            Assert.Equal((values.Count, values.Sum()), (tile.Days[i], tile.Sums[i]));
        }
    });

    // Sending again, replacing and withdrawing are all the same: the tile is made from the sheets that are current then.
    [Fact]
    public void The_order_of_uploads_leaves_no_trace() => Gen.Select(Gen.Enum<Measure>(), Sheets, Gen.Int).Sample((measure, sheets, seed) =>
    {
        var random = new Random(seed);
        var shuffled = sheets.OrderBy(_ => random.Next()).ToList();
        Assert.Equal(Bytes(MonthTile.FromSheets(measure, sheets)), Bytes(MonthTile.FromSheets(measure, shuffled)));
    });

    [Fact]
    public void A_month_without_the_measure_has_no_tile()
    {
        Assert.Null(MonthTile.FromSheets(Measure.Occupancy, []));
        var sweeps = new int[24];
        var grid = new CellGrid([1], [sweeps, new int[24], null, null, null, null, null, null]);
        Assert.NotNull(MonthTile.FromSheets(Measure.Occupancy, [grid]));
        Assert.Null(MonthTile.FromSheets(Measure.Signal, [grid]));
        Assert.Null(MonthTile.FromSheets(Measure.Excess, [grid]));
    }

    [Fact]
    public void The_largest_sums_fit()
    {
        var planes = new int[]?[CellGrid.QuantityCount];
        planes[(int)Quantity.Sweeps] = planes[(int)Quantity.Occupancy] = new int[24];
        planes[(int)Quantity.Signal] = [.. Enumerable.Repeat(30_000, 24)];
        planes[(int)Quantity.Floor] = [.. Enumerable.Repeat(-30_000, 24)];
        var tile = MonthTile.FromSheets(Measure.Excess, [.. Enumerable.Repeat(new CellGrid([1], planes), 31)])!;
        Assert.All(tile.Sums.ToArray(), sum => Assert.Equal(31 * 60_000, sum));
        Assert.Equal(tile.Sums.ToArray(), MonthTileCodec.Decode(MonthTileCodec.Encode(tile)).Sums.ToArray());
    }

    [Fact]
    public void Planes_of_the_wrong_length_are_refused()
    {
        Assert.Throws<ArgumentException>(() => new MonthTile([1], new byte[23], new int[23]));
        Assert.Throws<ArgumentException>(() => new MonthTile([1], new byte[24], new int[25]));
    }

    private static byte[] Bytes(MonthTile? tile) => tile is null ? [] : MonthTileCodec.Encode(tile);

    private static int? Value(Measure measure, CellGrid sheet, int hour, int band)
    {
        int? Read(Quantity quantity) => sheet[quantity, hour, band] is var value && value == CellGrid.Missing ? null : value;
        return measure switch
        {
            Measure.Occupancy => Read(Quantity.Occupancy),
            Measure.Signal => Read(Quantity.Signal),
            Measure.Excess => Read(Quantity.Signal) - Read(Quantity.Floor),
            Measure.Level => Read(Quantity.Level),
            Measure.LevelP90 => Read(Quantity.LevelP90),
            Measure.Floor => Read(Quantity.Floor),
            _ => Read(Quantity.Steady),
        };
    }
}
