using System.Collections.Immutable;
using System.Globalization;

namespace Bandtide.Core.Bands;

/// <summary>The bands every network starts with.</summary>
/// <remarks>
/// Limits: ITU Radio Regulations, Article 5, Table of Frequency Allocations. A listener hears what others transmit, whatever
/// his own Region, so a band is the union of the three Regions' allocations, except that what broadcasting and amateurs share
/// between Regions is a band of its own (3900-4000, 7200-7300 kHz), and that 2495-2502 kHz, standard frequency in Regions 2
/// and 3 and partly so in Region 1, is kept out of the 120 m band. Tropical broadcasting (No. 5.113): 120, 90 and 60 m.
/// The amateur 80 m band ends at 3900 kHz, where mixed use begins.
/// The order of the list gives the identities: append, never insert.
/// </remarks>
internal static class StandardBands
{
    private const short FirstServiceId = 1;
    private const short FirstSliceId = 100;

    private static readonly (string Code, string Name, double[] EdgesKhz)[] Service =
    [
        ("bc-lw", "Long-wave broadcasting", [148.5, 283.5]),
        ("bc-mw", "Medium-wave broadcasting", [525, 1705]),
        ("bc-120m", "120 m broadcasting", [2300, 2495]),
        ("bc-90m", "90 m broadcasting", [3200, 3400]),
        ("bc-60m", "60 m broadcasting", [4750, 4995, 5005, 5060]),
        ("bc-49m", "49 m broadcasting", [5900, 6200]),
        ("bc-41m", "41 m broadcasting", [7300, 7450]),
        ("bc-31m", "31 m broadcasting", [9400, 9900]),
        ("bc-25m", "25 m broadcasting", [11600, 12100]),
        ("bc-22m", "22 m broadcasting", [13570, 13870]),
        ("bc-19m", "19 m broadcasting", [15100, 15800]),
        ("bc-16m", "16 m broadcasting", [17480, 17900]),
        ("bc-15m", "15 m broadcasting", [18900, 19020]),
        ("bc-13m", "13 m broadcasting", [21450, 21850]),
        ("bc-11m", "11 m broadcasting", [25670, 26100]),
        ("ama-160m", "160 m amateur", [1800, 2000]),
        ("ama-80m", "80 m amateur", [3500, 3900]),
        ("ama-60m", "60 m amateur", [5351.5, 5366.5]),
        ("ama-40m", "40 m amateur", [7000, 7200]),
        ("ama-30m", "30 m amateur", [10100, 10150]),
        ("ama-20m", "20 m amateur", [14000, 14350]),
        ("ama-17m", "17 m amateur", [18068, 18168]),
        ("ama-15m", "15 m amateur", [21000, 21450]),
        ("ama-12m", "12 m amateur", [24890, 24990]),
        ("ama-10m", "10 m amateur", [28000, 29700]),
        ("mix-3900", "Broadcasting or amateur by Region", [3900, 4000]),
        ("mix-7200", "Broadcasting or amateur by Region", [7200, 7300]),
        ("std-2500", "Standard frequency 2500 kHz", [2495, 2502]),
        ("std-5000", "Standard frequency 5000 kHz", [4995, 5005]),
        ("std-10000", "Standard frequency 10000 kHz", [9995, 10005]),
        ("std-15000", "Standard frequency 15000 kHz", [14990, 15010]),
        ("std-20000", "Standard frequency 20000 kHz", [19990, 20010]),
        ("std-25000", "Standard frequency 25000 kHz", [24990, 25010]),
    ];

    /// <summary>Service bands in the written order, then the thirty slices.</summary>
    public static IEnumerable<Band> All()
    {
        for (var i = 0; i < Service.Length; i++)
        {
            var (code, name, edges) = Service[i];
            var segments = edges.Chunk(2).Select(pair => new FrequencySegment(Hz(pair[0]), Hz(pair[1]))).ToImmutableArray();
            yield return new((short)(FirstServiceId + i), code, BandLayer.Service, name, segments);
        }

        for (var megahertz = 0; megahertz < 30; megahertz++)
        {
            yield return new(
                (short)(FirstSliceId + megahertz),
                string.Create(CultureInfo.InvariantCulture, $"mhz-{megahertz:00}"),
                BandLayer.Slice,
                string.Create(CultureInfo.InvariantCulture, $"{megahertz} MHz slice"),
                [new FrequencySegment(megahertz * 1_000_000, (megahertz + 1) * 1_000_000)]);
        }
    }

    private static int Hz(double kilohertz) => (int)Math.Round(kilohertz * 1000);
}
