using Bandtide.Core.Bands;

namespace Bandtide.Server.Demo;

/// <summary>How a band is used in the invented scenario.</summary>
/// <param name="Id">Identity in the plan.</param>
/// <param name="Code">Code in the plan.</param>
/// <param name="Megahertz">The middle of the band, geometric.</param>
/// <param name="Use">Who transmits.</param>
/// <param name="StrengthDb">How far a typical transmitter 500 km away stands above the noise of a rural place, without absorption.</param>
/// <param name="Density">Occupancy when all the world is heard.</param>
/// <param name="Local">Contribution of ground wave: heard at any hour.</param>
/// <param name="SummerFactor">How much busier the band is in the summer season of broadcasting than on average.</param>
internal sealed record DemoBand(
    short Id, string Code, float Megahertz, DemoUse Use, float StrengthDb, float Density, float Local, float SummerFactor)
{
    private static readonly (string Code, float StrengthDb, float Density, float SummerFactor)[] Service =
    [
        ("bc-lw", 66, .45f, 1f), ("bc-mw", 62, .88f, 1f), ("bc-120m", 38, .06f, .9f), ("bc-90m", 40, .09f, .9f), ("bc-60m", 44, .16f, .95f),
        ("bc-49m", 56, .72f, .88f), ("bc-41m", 56, .74f, .92f), ("bc-31m", 56, .70f, 1f), ("bc-25m", 55, .66f, 1f), ("bc-22m", 54, .52f, 1.05f),
        ("bc-19m", 54, .60f, 1.08f), ("bc-16m", 52, .40f, 1.15f), ("bc-15m", 48, .10f, 1.15f), ("bc-13m", 50, .26f, 1.2f), ("bc-11m", 44, .05f, 1.2f),
        ("ama-160m", 31, .16f, 1f), ("ama-80m", 33, .34f, 1f), ("ama-60m", 30, .20f, 1f), ("ama-40m", 35, .62f, 1f), ("ama-30m", 32, .36f, 1f),
        ("ama-20m", 36, .58f, 1f), ("ama-17m", 33, .36f, 1f), ("ama-15m", 34, .40f, 1f), ("ama-12m", 31, .22f, 1f), ("ama-10m", 33, .20f, 1f),
        ("mix-3900", 46, .40f, .95f), ("mix-7200", 50, .62f, .95f),
        ("std-2500", 40, .92f, 1f), ("std-5000", 42, .96f, 1f), ("std-10000", 43, .97f, 1f), ("std-15000", 42, .95f, 1f), ("std-20000", 36, .75f, 1f), ("std-25000", 33, .60f, 1f),
    ];

    // Slices that hold much broadcasting are fuller.
    private static readonly int[] FullSlices = [0, 1, 5, 6, 7, 9, 11, 13, 15, 17];

    /// <summary>Every band of the standard plan, by ascending identity.</summary>
    public static IReadOnlyList<DemoBand> All { get; } = [.. Make().OrderBy(band => band.Id)];

    private static IEnumerable<DemoBand> Make()
    {
        foreach (var (code, strength, density, summer) in Service)
        {
            _ = BandPlan.Standard.TryGet(code, out var band);
            yield return Of(band!, UseOf(code), strength, density, code switch { "bc-lw" => .08f, "bc-mw" => .16f, _ => 0f }, summer);
        }

        foreach (var slice in BandPlan.Standard.Layer(BandLayer.Slice))
        {
            var megahertz = slice.LowHz / 1_000_000;
            yield return Of(slice, DemoUse.Mixture, megahertz < 2 ? 58 : 48 - 0.4f * megahertz, FullSlices.Contains(megahertz) ? .42f : .20f, megahertz < 2 ? .12f : 0f, 1f);
        }
    }

    private static DemoBand Of(Band band, DemoUse use, float strength, float density, float local, float summer) =>
        new(band.Id, band.Code, MathF.Sqrt(Math.Max(band.LowHz, 100_000f) * band.HighHz) / 1e6f, use, strength, density, local, summer);

    private static DemoUse UseOf(string code) => code[..3] switch
    {
        "ama" => DemoUse.Amateur,
        "std" => DemoUse.Standard,
        _ => DemoUse.Broadcasting,
    };
}
