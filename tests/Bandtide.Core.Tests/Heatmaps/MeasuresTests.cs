using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Tests.Sheets;
using CsCheck;

namespace Bandtide.Core.Tests.Heatmaps;

public sealed class MeasuresTests
{
    // The words of the data contract, in its order.
    [Fact]
    public void The_words_are_those_of_the_contract() => Assert.Equal(
        ["occupancy", "signal", "excess", "level", "level-p90", "floor", "steady"], Measures.All.Select(info => info.Code));

    [Fact]
    public void The_table_has_a_row_for_every_measure_at_its_place() => Assert.All(Enum.GetValues<Measure>(), measure =>
    {
        Assert.Equal(measure, measure.Info().Measure);
        Assert.Same(measure.Info(), Measures.Find(measure.Info().Code));
        Assert.Equal(SheetFields.Decimals(measure.Info().Quantity), measure.Info().Decimals);
        Assert.Equal(1, measure.Info().Resolution * measure.Info().StepsPerUnit, 1e-15);
    });

    [Fact]
    public void Other_words_are_no_measures()
    {
        Assert.Null(Measures.Find(null));
        Assert.Null(Measures.Find("Occupancy"));
        Assert.Null(Measures.Find("level_p90"));
    }

    [Fact]
    public void Excess_is_signal_minus_floor_where_both_are() => SheetSamples.Grid.Sample(grid =>
    {
        var values = Measures.Values(grid, Measure.Excess, new int[24 * grid.BandCount]);
        for (var i = 0; i < values.Length; i++)
        {
            var (signal, floor) = (grid[Quantity.Signal, i / grid.BandCount, i % grid.BandCount], grid[Quantity.Floor, i / grid.BandCount, i % grid.BandCount]);
            Assert.Equal(signal == CellGrid.Missing || floor == CellGrid.Missing ? CellGrid.Missing : signal - floor, values[i]);
        }

        Assert.Equal(grid.Plane(Quantity.Signal).IsEmpty || grid.Plane(Quantity.Floor).IsEmpty, values.IsEmpty);
    });
}
