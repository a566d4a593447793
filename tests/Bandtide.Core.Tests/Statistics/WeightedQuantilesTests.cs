using Bandtide.Core.Statistics;
using Bandtide.Testing;
using CsCheck;

namespace Bandtide.Core.Tests.Statistics;

public sealed class WeightedQuantilesTests
{
    private static readonly Gen<(double Value, double Weight)[]> Items = Gen.Select(Gen.Int[-20, 20], Gen.Int[1, 31])
        .Select((value, days) => ((double)value, 1.0 / days)).Array[1, 30].Select(items => items.OrderBy(item => item.Item1).ThenBy(item => item.Item2).ToArray());

    // Reference/stats_results.csv, rows weighted_quantile_midpoint_interp: computed from the definition outside this code base.
    [Theory]
    [InlineData(0.10, 1.125)]
    [InlineData(0.25, 1.5)]
    [InlineData(0.50, 2.6)]
    [InlineData(0.75, 3.33333333333)]
    [InlineData(0.90, 6.5)]
    public void Weighted_quantiles_are_the_reference_values(double p, double expected) =>
        Assert.Equal(expected, WeightedQuantiles.Of(p, [1, 1.5, 2.6, 3, 4, 9], [1, 3, 2, 2, 1, 1]), 1e-9);

    // By hand: weights 1, 2, 1 put the values at 1/8, 1/2 and 7/8 of the total; 0.2 is a fifth of the way from the first to the second.
    [Theory]
    [InlineData(0.10, 10)]
    [InlineData(0.125, 10)]
    [InlineData(0.20, 12)]
    [InlineData(0.50, 20)]
    [InlineData(0.6875, 30)]
    [InlineData(0.95, 40)]
    public void Quantiles_are_read_between_the_midpoints_of_weight(double p, double expected) =>
        Assert.Equal(expected, WeightedQuantiles.Of(p, [10, 20, 40], [1, 2, 1]), 1e-12);

    // Ozone of R's airquality, n = 116. R 4.2.2 gives types 1, 2 and 7 (quantile()); type 5 follows: where n p is whole it is type 2;
    // at 0.9 it lies 0.9 of the way from the 104th value (twice type 7 less type 1 = 85) to the 105th (type 1 = 89), at 0.1
    // between the 12th and 13th, both 11.
    [Theory]
    [InlineData(0.10, 11)]
    [InlineData(0.25, 18)]
    [InlineData(0.50, 31.5)]
    [InlineData(0.75, 63.5)]
    [InlineData(0.90, 88.6)]
    public void With_equal_weights_they_are_definition_five_of_Hyndman_and_Fan(double p, double expected) =>
        Assert.Equal(expected, OzoneQuantile(p), 1e-9);

    [Fact]
    public void A_quantile_lies_among_the_values_and_rises_with_the_probability() => Gen.Select(Items, Gen.Double.Unit, Gen.Double.Unit).Sample((items, p, q) =>
    {
        var (low, high) = (Of(Math.Min(p, q), items), Of(Math.Max(p, q), items));
        Assert.InRange(low, items[0].Value, items[^1].Value);
        Assert.True(low <= high + 1e-12);
    });

    [Fact]
    public void Weights_count_by_their_ratio_alone() => Gen.Select(Items, Gen.Double.Unit, Gen.Double[0.01, 100]).Sample((items, p, factor) =>
        Assert.Equal(Of(p, items), Of(p, [.. items.Select(item => (item.Value, item.Weight * factor))]), 1e-9));

    [Fact]
    public void Values_turned_round_give_quantiles_turned_round() => Gen.Select(Items, Gen.Double.Unit).Sample((items, p) =>
    {
        var distinct = items.DistinctBy(item => item.Value).ToArray();
        Assert.Equal(Of(p, distinct), -Of(1 - p, [.. distinct.Reverse().Select(item => (-item.Value, item.Weight))]), 1e-9);
    });

    [Fact]
    public void Without_values_or_with_other_numbers_of_weights_there_is_none()
    {
        Assert.Throws<ArgumentException>(() => WeightedQuantiles.Of(0.5, [], []));
        Assert.Throws<ArgumentException>(() => WeightedQuantiles.Of(0.5, [1, 2], [1]));
    }

    private static double Of(double p, (double Value, double Weight)[] items) =>
        WeightedQuantiles.Of(p, [.. items.Select(item => item.Value)], [.. items.Select(item => item.Weight)]);

    private static double OzoneQuantile(double p)
    {
        double[] ozone = [.. ReferenceTable.Load("data_airquality.csv")
            .Where(row => row.Text("Ozone") is not ("" or "NA")).Select(row => row.Number("Ozone")).Order()];
        return WeightedQuantiles.Of(p, ozone, [.. ozone.Select(_ => 1.0)]);
    }
}
