using System.Text;
using Bandtide.Core.Bands;
using CsCheck;

namespace Bandtide.Core.Tests.Bands;

public sealed class BandPlanTests
{
    private static readonly Band Extra =
        new(BandPlan.FirstAddedId, "mar-8m", BandLayer.Service, "8 MHz maritime", [new FrequencySegment(8_195_000, 8_815_000)]);

    [Theory]
    [InlineData(BandLayer.Service)]
    [InlineData(BandLayer.Slice)]
    public void Bands_of_a_layer_ascend_and_do_not_overlap(BandLayer layer)
    {
        var bands = BandPlan.Standard.Layer(layer);
        Assert.Equal(bands.OrderBy(band => band.LowHz), bands);
        Assert.All(bands, band => Assert.Equal(layer, band.Layer));
        var segments = bands.SelectMany(band => band.Segments).OrderBy(segment => segment.LowHz).ToList();
        Assert.All(segments.Zip(segments.Skip(1)), pair => Assert.True(pair.First.HighHz <= pair.Second.LowHz, $"{pair}"));
    }

    [Fact]
    public void Slices_tile_zero_to_thirty_megahertz()
    {
        var slices = BandPlan.Standard.Layer(BandLayer.Slice);
        Assert.Equal(30, slices.Count);
        Assert.Equal(0, slices[0].LowHz);
        Assert.Equal(30_000_000, slices[^1].HighHz);
        Assert.All(slices.Zip(slices.Skip(1)), pair => Assert.Equal(pair.First.HighHz, pair.Second.LowHz));
        Assert.All(slices, slice => Assert.Equal(1_000_000, slice.WidthHz));
    }

    [Fact]
    public void A_frequency_lies_in_the_slice_of_its_megahertz_and_in_at_most_one_service_band() =>
        Gen.Int[0, 29_999_999].Sample(hz =>
            BandPlan.Standard.At(BandLayer.Slice, hz)!.Id == 100 + hz / 1_000_000
            && BandPlan.Standard.Layer(BandLayer.Service).Count(band => band.Contains(hz)) <= 1);

    [Fact]
    public void An_edge_belongs_to_the_band_above_it()
    {
        Assert.Equal("mhz-05", BandPlan.Standard.At(BandLayer.Slice, 5_000_000)!.Code);
        Assert.Equal("mhz-04", BandPlan.Standard.At(BandLayer.Slice, 4_999_999.999)!.Code);
        Assert.Equal("mix-7200", BandPlan.Standard.At(BandLayer.Service, 7_200_000)!.Code);
        Assert.Equal("bc-41m", BandPlan.Standard.At(BandLayer.Service, 7_300_000)!.Code);
        Assert.Null(BandPlan.Standard.At(BandLayer.Service, 7_450_000));
        Assert.Null(BandPlan.Standard.At(BandLayer.Slice, 30_000_000));
    }

    // The stored sheets know bands by these numbers: a change here is a change of every database.
    [Fact]
    public void Identities_are_fixed()
    {
        string[] service =
        [
            "bc-lw", "bc-mw", "bc-120m", "bc-90m", "bc-60m", "bc-49m", "bc-41m", "bc-31m", "bc-25m", "bc-22m", "bc-19m", "bc-16m", "bc-15m",
            "bc-13m", "bc-11m", "ama-160m", "ama-80m", "ama-60m", "ama-40m", "ama-30m", "ama-20m", "ama-17m", "ama-15m", "ama-12m", "ama-10m",
            "mix-3900", "mix-7200", "std-2500", "std-5000", "std-10000", "std-15000", "std-20000", "std-25000",
        ];
        Assert.Equal(service, BandPlan.Standard.Layer(BandLayer.Service).OrderBy(band => band.Id).Select(band => band.Code), StringComparer.Ordinal);
        Assert.Equal(Enumerable.Range(1, 33), BandPlan.Standard.Layer(BandLayer.Service).Select(band => (int)band.Id).Order());
        Assert.Equal(Enumerable.Range(100, 30), BandPlan.Standard.Layer(BandLayer.Slice).Select(band => (int)band.Id));
    }

    [Fact]
    public void Every_band_is_found_by_code_by_bytes_and_by_identity() => Assert.All(BandPlan.Standard.All, band =>
    {
        Assert.True(BandPlan.Standard.TryGet(band.Code, out var byText));
        Assert.True(BandPlan.Standard.TryGet(Encoding.UTF8.GetBytes(band.Code), out var byBytes));
        Assert.Same(band, byText);
        Assert.Same(band, byBytes);
        Assert.Same(band, BandPlan.Standard.ById(band.Id));
    });

    [Fact]
    public void Bytes_are_looked_up_as_text_is() =>
        Gen.OneOf(Gen.String[Gen.Char["abcm-0123456789z"], 0, 10], Gen.Int[0, BandPlan.Standard.All.Count - 1].Select(i => BandPlan.Standard.All[i].Code), Gen.String)
            .Sample(text => BandPlan.Standard.TryGet(text, out var byText) == BandPlan.Standard.TryGet(Encoding.UTF8.GetBytes(text), out var byBytes)
                && ReferenceEquals(byText, byBytes));

    [Fact]
    public void Looking_up_bytes_allocates_nothing()
    {
        var code = "bc-49m"u8.ToArray();
        _ = BandPlan.Standard.TryGet(code, out _);
        var before = GC.GetAllocatedBytesForCurrentThread();
        for (var i = 0; i < 1000; i++)
        {
            _ = BandPlan.Standard.TryGet(code, out _);
        }

        Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());
    }

    [Fact]
    public void Unknown_codes_and_identities_are_not_found()
    {
        Assert.False(BandPlan.Standard.TryGet("bc-50m", out _));
        Assert.False(BandPlan.Standard.TryGet("BC-49M"u8, out _));
        Assert.False(BandPlan.Standard.TryGet(""u8, out _));
        Assert.Null(BandPlan.Standard.ById(0));
        Assert.Null(BandPlan.Standard.ById(1000));
    }

    [Fact]
    public void A_plan_grows_and_the_old_one_stays()
    {
        var grown = BandPlan.Standard.With([Extra]);
        Assert.True(grown.IsAccepted);
        Assert.Empty(grown.Problems);
        Assert.True(grown.Plan.TryGet("mar-8m"u8, out var found));
        Assert.Same(Extra, found);
        Assert.Equal(1001, grown.Plan.NextId);
        Assert.Equal(1000, BandPlan.Standard.NextId);
        Assert.False(BandPlan.Standard.TryGet("mar-8m", out _));
        Assert.Equal(34, grown.Plan.Layer(BandLayer.Service).Count);
        Assert.Equal(grown.Plan.Layer(BandLayer.Service).OrderBy(band => band.LowHz), grown.Plan.Layer(BandLayer.Service));
    }

    [Fact]
    public void Nothing_added_is_the_same_plan() => Assert.Equal(BandPlan.Standard.All, BandPlan.Standard.With([]).Plan!.All);

    public static TheoryData<string, Band> Refused => new()
    {
        { "code", Extra with { Code = "Mar-8M" } },
        { "code", Extra with { Code = "m" } },
        { "duplicate", Extra with { Code = "bc-49m" } },
        { "id", Extra with { Id = 999 } },
        { "name", Extra with { Name = " " } },
        { "layer", Extra with { Layer = (BandLayer)7 } },
        { "segments", Extra with { Segments = [] } },
        { "segments", Extra with { Segments = default } },
        { "segments", Extra with { Segments = [default] } },
        { "segments", Extra with { Segments = [new(8_500_000, 8_600_000), new(8_195_000, 8_300_000)] } },
        { "segments", Extra with { Segments = [new(8_195_000, 8_300_000), new(8_299_999, 8_600_000)] } },
        { "range", Extra with { Segments = [new(29_800_000, 30_000_001)] } },
        { "overlap", Extra with { Segments = [new(9_399_000, 9_400_001)] } },
        { "overlap", Extra with { Layer = BandLayer.Slice, Segments = [new(8_195_000, 8_815_000)] } },
    };

    [Theory, MemberData(nameof(Refused))]
    public void A_band_that_breaks_a_rule_is_refused_with_the_reason(string rule, Band band)
    {
        var refusal = BandPlan.Standard.With([band]);
        Assert.False(refusal.IsAccepted);
        Assert.Null(refusal.Plan);
        Assert.Equal(rule, Assert.Single(refusal.Problems).Rule);
        Assert.Equal(band.Code, refusal.Problems[0].Code);
    }

    [Fact]
    public void Bands_added_together_are_held_against_each_other()
    {
        var rules = BandPlan.Standard.With([Extra, Extra]).Problems.Select(problem => problem.Rule);
        Assert.Equal(["duplicate", "id", "overlap"], rules, StringComparer.Ordinal);
    }

    [Fact]
    public void Touching_bands_do_not_overlap() =>
        Assert.True(BandPlan.Standard.With([Extra with { Segments = [new(9_300_000, 9_400_000)] }]).IsAccepted);
}
