using Bandtide.Core.Bands;
using Bandtide.Testing;

namespace Bandtide.Core.Tests.Bands;

/// <summary>Limits of the service bands against the allocations of the ITU Radio Regulations, Article 5, in all three Regions.
/// How sure each limit is stands in the file: high was read in a national table, medium and low are from memory or a public list.</summary>
public sealed class AllocationTests
{
    private const double LowestEdgeOfPlanKhz = 148.5;
    private static readonly string[] Confidences = ["low", "medium", "high"];
    private static readonly ReferenceTable Allocations = ReferenceTable.Load("itu_allocations_hf.csv");

    /// <summary>The edges that no row of high confidence has, with the best there is; all others are high.</summary>
    private static readonly Dictionary<(string Code, double Khz), string> LessSure = new()
    {
        [("bc-lw", 148.5)] = "medium",
        [("bc-lw", 283.5)] = "medium",
        [("bc-mw", 525)] = "medium",
        [("bc-mw", 1705)] = "medium",
        [("bc-120m", 2300)] = "medium",
        [("bc-120m", 2495)] = "medium",
        [("mix-3900", 3900)] = "medium",
        [("std-2500", 2495)] = "medium",
    };

    public static TheoryData<string, double, bool, string> Edges
    {
        get
        {
            var edges = new TheoryData<string, double, bool, string>();
            foreach (var band in BandPlan.Standard.Layer(BandLayer.Service))
            {
                foreach (var segment in band.Segments)
                {
                    Add(band.Code, segment.LowHz / 1000.0, isLow: true);
                    Add(band.Code, segment.HighHz / 1000.0, isLow: false);
                }
            }

            return edges;

            void Add(string code, double khz, bool isLow) => edges.Add(code, khz, isLow, LessSure.GetValueOrDefault((code, khz), "high"));
        }
    }

    [Theory, MemberData(nameof(Edges))]
    public void Every_edge_is_the_limit_of_an_allocation_to_the_service(string code, double khz, bool isLow, string confidence)
    {
        var column = isLow ? "low_khz" : "high_khz";
        var rows = Allocations.Where(row => IsOfKind(row, code) && row.Number(column) == khz).ToList();
        Assert.NotEmpty(rows);
        Assert.Equal(confidence, Confidences[rows.Max(row => Array.IndexOf(Confidences, row.Text("confidence")))]);
    }

    [Fact]
    public void No_band_reaches_beyond_what_some_Region_allocates() =>
        Assert.All(BandPlan.Standard.Layer(BandLayer.Service).SelectMany(band => band.Segments, (band, segment) => (band, segment)), part =>
        {
            // Allocations lie end to end or overlap: walk up from the low edge as far as they carry.
            var reached = part.segment.LowHz / 1000.0;
            foreach (var row in Allocations.Where(row => IsOfKind(row, part.band.Code)).OrderBy(row => row.Number("low_khz")))
            {
                reached = row.Number("low_khz") <= reached ? Math.Max(reached, row.Number("high_khz")) : reached;
            }

            Assert.True(reached >= part.segment.HighHz / 1000.0, $"{part.band.Label}: allocations end at {reached} kHz");
        });

    [Fact]
    public void No_allocation_to_these_services_is_left_out()
    {
        var rows = Allocations.Where(row => row.Number("low_khz") >= LowestEdgeOfPlanKhz && row.Number("high_khz") <= 30_000
            && (IsOfKind(row, "bc-") || IsOfKind(row, "ama-") || IsOfKind(row, "std-"))
            && row.Number("low_khz") is not 472).ToList();
        Assert.True(rows.Count > 100);
        Assert.All(rows, row =>
        {
            for (var hz = row.Number("low_khz") * 1000; hz < row.Number("high_khz") * 1000; hz += 500)
            {
                Assert.True(BandPlan.Standard.At(BandLayer.Service, hz) is not null, $"{row}: {hz} Hz is in no band");
            }
        });
    }

    [Theory]
    [InlineData("mix-3900")]
    [InlineData("mix-7200")]
    public void A_mixed_band_is_broadcasting_in_one_Region_and_amateur_in_another(string code)
    {
        Assert.True(BandPlan.Standard.TryGet(code, out var band));
        var middle = (band.LowHz + band.HighHz) / 2000.0 + 1;
        var services = Allocations
            .Where(row => row.Number("low_khz") <= middle && middle < row.Number("high_khz"))
            .ToLookup(row => row.Text("service"), row => row.Text("region"), StringComparer.Ordinal);
        Assert.NotEmpty(services["broadcasting"]);
        Assert.NotEmpty(services["amateur"]);
        Assert.Empty(services["broadcasting"].Intersect(services["amateur"], StringComparer.Ordinal));
    }

    private static bool IsOfKind(ReferenceRow row, string code) => row.Text("service") switch
    {
        "broadcasting" or "broadcasting_tropical" => code.StartsWith("bc-", StringComparison.Ordinal) || code.StartsWith("mix-", StringComparison.Ordinal),
        "amateur" => code.StartsWith("ama-", StringComparison.Ordinal) || code.StartsWith("mix-", StringComparison.Ordinal),
        "standard_frequency_time" => code.StartsWith("std-", StringComparison.Ordinal),
        _ => false,
    };
}
