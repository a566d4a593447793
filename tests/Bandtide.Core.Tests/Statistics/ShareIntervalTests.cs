using Bandtide.Core.Statistics;
using CsCheck;

namespace Bandtide.Core.Tests.Statistics;

public sealed class ShareIntervalTests
{
    [Fact]
    public void An_interval_holds_its_mean_and_stays_within_nought_and_one() => Gen.Select(Gen.Double.Unit, Gen.Double[0, 20], Gen.Double[0.5, 1e6]).Sample((mean, half, looks) =>
    {
        var (lower, upper) = ShareInterval.Around(mean, half, looks);
        Assert.True(lower >= 0 && lower <= mean && mean <= upper && upper <= 1 && lower < upper);
    });

    [Fact]
    public void Turned_round_it_is_the_same() => Gen.Select(Gen.Double.Unit, Gen.Double[0, 1], Gen.Double[0.5, 1e6]).Sample((mean, half, looks) =>
    {
        var (lower, upper) = ShareInterval.Around(mean, half, looks);
        var (low, high) = ShareInterval.Around(1 - mean, half, looks);
        Assert.Equal(1 - upper, low, 1e-9);
        Assert.Equal(1 - lower, high, 1e-9);
    });

    // Around one half and narrow, the logit is straight: the interval is the plain one.
    [Fact]
    public void In_the_middle_it_is_the_plain_interval()
    {
        var (lower, upper) = ShareInterval.Around(0.5, 0.02, 1e6);
        Assert.Equal(0.48, lower, 1e-4);
        Assert.Equal(0.52, upper, 1e-4);
    }

    // (k + 0.5)/(n + 1) with k = 0, n = 9 is 0.05; its logit has the variance 1/(10 x 0.05 x 0.95), so 1.95996 standard errors above it.
    [Fact]
    public void At_nought_by_hand()
    {
        var logit = Math.Log(0.05 / 0.95) + 1.959964 / Math.Sqrt(10 * 0.05 * 0.95);
        Assert.Equal((0, 1 / (1 + Math.Exp(-logit))), ShareInterval.Around(0, 0, 9), new Near());
    }

    private sealed class Near : IEqualityComparer<(double, double)>
    {
        public bool Equals((double, double) x, (double, double) y) => Math.Abs(x.Item1 - y.Item1) + Math.Abs(x.Item2 - y.Item2) < 1e-6;

        public int GetHashCode((double, double) obj) => 0;
    }
}
