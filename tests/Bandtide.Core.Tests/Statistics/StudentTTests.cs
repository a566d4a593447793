using Bandtide.Core.Statistics;
using CsCheck;

namespace Bandtide.Core.Tests.Statistics;

public sealed class StudentTTests
{
    // NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2, upper critical values, as reprinted in a book's appendix
    // (columns 0.10 to 0.005; the column 0.001 is known to be off in the last digit).
    [Theory]
    [InlineData(1, 3.078, 6.314, 12.706, 31.821, 63.657)]
    [InlineData(2, 1.886, 2.920, 4.303, 6.965, 9.925)]
    [InlineData(3, 1.638, 2.353, 3.182, 4.541, 5.841)]
    [InlineData(4, 1.533, 2.132, 2.776, 3.747, 4.604)]
    [InlineData(5, 1.476, 2.015, 2.571, 3.365, 4.032)]
    [InlineData(10, 1.372, 1.812, 2.228, 2.764, 3.169)]
    [InlineData(20, 1.325, 1.725, 2.086, 2.528, 2.845)]
    [InlineData(30, 1.310, 1.697, 2.042, 2.457, 2.750)]
    [InlineData(60, 1.296, 1.671, 2.000, 2.390, 2.660)]
    [InlineData(100, 1.290, 1.660, 1.984, 2.364, 2.626)]
    [InlineData(double.PositiveInfinity, 1.282, 1.645, 1.960, 2.326, 2.576)]
    public void Quantiles_are_those_of_the_table(double df, double q90, double q95, double q975, double q99, double q995)
    {
        foreach (var (probability, expected) in new[] { (0.9, q90), (0.95, q95), (0.975, q975), (0.99, q99), (0.995, q995) })
        {
            Assert.Equal(expected, StudentT.Quantile(probability, df), 5.1e-4);
            Assert.Equal(-expected, StudentT.Quantile(1 - probability, df), 5.1e-4);
        }

        Assert.Equal(q975, StudentT.HalfWidth95(df), 5.1e-4);
    }

    // With 1 degree of freedom it is the Cauchy distribution, with 2 it is algebraic.
    [Fact]
    public void One_and_two_degrees_of_freedom_have_closed_forms() => Gen.Double[1e-6, 1 - 1e-6].Sample(probability =>
    {
        var cauchy = Math.Tan(Math.PI * (probability - 0.5));
        Assert.Equal(cauchy, StudentT.Quantile(probability, 1), 1e-9 * (1 + Math.Abs(cauchy)));
        var algebraic = (2 * probability - 1) / Math.Sqrt(2 * probability * (1 - probability));
        Assert.Equal(algebraic, StudentT.Quantile(probability, 2), 1e-9 * (1 + Math.Abs(algebraic)));
    });

    [Fact]
    public void A_quantile_has_its_probability_below_it() => Gen.Select(Gen.Double[1e-4, 0.9999], Gen.Double[0.5, 500]).Sample(
        (probability, df) => Assert.Equal(probability, StudentT.Cumulative(StudentT.Quantile(probability, df), df), 1e-11));

    [Fact]
    public void The_table_for_intervals_is_the_quantile() => Gen.Double[0, 1].Sample(
        inverse => Assert.Equal(StudentT.Quantile(0.975, 1 / inverse), StudentT.HalfWidth95(1 / inverse), 1e-5));

    // Areas from 0 to z, four decimals: standard table, as printed in textbooks.
    [Theory]
    [InlineData(0.50, 0.1915)]
    [InlineData(1.00, 0.3413)]
    [InlineData(1.45, 0.4265)]
    [InlineData(1.90, 0.4713)]
    [InlineData(0.05, 0.0199)]
    public void Normal_probabilities_are_those_of_the_table(double z, double area)
    {
        Assert.Equal(0.5 + area, Normal.Cumulative(z), 5.1e-5);
        Assert.Equal(0.5 - area, Normal.Cumulative(-z), 5.1e-5);
    }

    [Fact]
    public void A_normal_quantile_has_its_probability_below_it() => Gen.Double[1e-12, 1 - 1e-12].Sample(
        probability => Assert.Equal(1, Normal.Cumulative(Normal.Quantile(probability)) / probability, 1e-12));

    // erfc by its integral: composite Simpson over the tail, an independent way to the same number.
    [Theory]
    [InlineData(0.3)]
    [InlineData(2.9)]
    [InlineData(3.1)]
    [InlineData(6)]
    public void The_normal_tail_is_the_integral_of_the_density(double z)
    {
        const int steps = 20_000;
        const double width = 12.0 / steps;
        var sum = 0.0;
        for (var i = 0; i <= steps; i++)
        {
            var x = z + i * width;
            sum += (i == 0 || i == steps ? 1 : i % 2 == 1 ? 4 : 2) * Math.Exp(-x * x / 2);
        }

        Assert.Equal(1, Normal.Cumulative(-z) / (sum * width / 3 / Math.Sqrt(2 * Math.PI)), 1e-9);
    }

    [Theory]
    [InlineData(0, 5)]
    [InlineData(1, 5)]
    [InlineData(0.5, 0)]
    public void What_has_no_quantile_is_refused(double probability, double df) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => StudentT.Quantile(probability, df));
}
