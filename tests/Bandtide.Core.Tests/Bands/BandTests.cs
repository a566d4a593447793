using Bandtide.Core.Bands;

namespace Bandtide.Core.Tests.Bands;

public sealed class BandTests
{
    [Theory]
    [InlineData("bc-31m", "31 m broadcasting, 9400–9900 kHz", "9400–9900 kHz")]
    [InlineData("bc-60m", "60 m broadcasting, 4750–4995 and 5005–5060 kHz", "4750–5060 kHz")]
    [InlineData("bc-lw", "Long-wave broadcasting, 148.5–283.5 kHz", "148.5–283.5 kHz")]
    [InlineData("ama-60m", "60 m amateur, 5351.5–5366.5 kHz", "5351.5–5366.5 kHz")]
    [InlineData("mhz-05", "5 MHz slice, 5000–6000 kHz", "5000–6000 kHz")]
    public void Labels_show_kilohertz(string code, string label, string shortLabel)
    {
        var band = Find(code);
        Assert.Equal(label, band.Label);
        Assert.Equal(shortLabel, band.ShortLabel);
    }

    [Fact]
    public void Every_label_is_unique_and_shows_kilohertz()
    {
        Assert.All(BandPlan.Standard.All, band => Assert.EndsWith(" kHz", band.Label, StringComparison.Ordinal));
        Assert.Equal(BandPlan.Standard.All.Count, BandPlan.Standard.All.Select(band => band.Label).Distinct(StringComparer.Ordinal).Count());
    }

    [Fact]
    public void A_gap_between_segments_is_not_part_of_the_band()
    {
        var band = Find("bc-60m");
        Assert.Equal(300_000, band.WidthHz);
        Assert.True(band.Contains(4_994_999));
        Assert.False(band.Contains(4_995_000));
        Assert.False(band.Contains(5_000_000));
        Assert.True(band.Contains(5_005_000));
        Assert.False(band.Contains(5_060_000));
    }

    [Fact]
    public void Bands_with_equal_parts_are_equal()
    {
        var band = Find("bc-60m");
        var copy = band with { Segments = [.. band.Segments] };
        Assert.Equal(band, copy);
        Assert.Equal(band.GetHashCode(), copy.GetHashCode());
        Assert.NotEqual(band, band with { Segments = [band.Segments[0]] });
        Assert.NotEqual(band, band with { Name = "Other" });
    }

    [Theory]
    [InlineData(-1, 5)]
    [InlineData(5, 5)]
    [InlineData(6, 5)]
    public void There_is_no_such_segment(int low, int high)
    {
        Assert.False(FrequencySegment.TryCreate(low, high, out _));
        Assert.Throws<ArgumentOutOfRangeException>(() => new FrequencySegment(low, high));
    }

    private static Band Find(string code) => BandPlan.Standard.TryGet(code, out var band) ? band : throw new KeyNotFoundException(code);
}
