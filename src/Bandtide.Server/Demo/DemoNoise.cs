namespace Bandtide.Server.Demo;

/// <summary>Noise at a station as external noise figure: dB above the thermal noise of 290 K.</summary>
internal static class DemoNoise
{
    /// <summary>
    /// Median man-made noise, ITU-R P.372-17, section 4.1, equation 17 and Table 1; galactic noise in the same form, 52 - 23 log f.
    /// </summary>
    /// <param name="environment">Environment of the station's setup.</param>
    /// <param name="megahertz">Frequency.</param>
    public static double ManMadeDb(string environment, double megahertz)
    {
        var (c, d) = environment switch
        {
            "city" => (76.8, 27.7),
            "residential" => (72.5, 27.7),
            "rural" => (67.2, 27.7),
            _ => (53.6, 28.6),
        };
        return c - d * Math.Log10(megahertz);
    }

    /// <summary>All noise together.</summary>
    /// <param name="environment">Environment of the station's setup.</param>
    /// <param name="megahertz">Frequency.</param>
    /// <param name="cosZenith">Of the Sun: atmospheric noise travels far by night.</param>
    /// <param name="tropical">1 in the tropics, 0 far from them.</param>
    /// <param name="summer">1 in the local summer, -1 in winter.</param>
    public static double TotalDb(string environment, double megahertz, double cosZenith, double tropical, double summer)
    {
        // The layer that sends everything else back hides the sky below about 8 MHz.
        var galactic = megahertz < 8 ? 0 : Power(52 - 23 * Math.Log10(megahertz));
        return 10 * Math.Log10(
            Power(ManMadeDb(environment, megahertz)) + galactic + Power(AtmosphericDb(megahertz, cosZenith, tropical, summer)) + Power(14));
    }

    /// <summary>Field strength of noise at a short vertical monopole, dB(uV/m).</summary>
    /// <remarks>ITU-R P.372, section 2: E = Fa + 20 log f + 10 log b - 95.5 (from memory).</remarks>
    public static double FieldStrengthDb(double figureDb, double megahertz, double bandwidthHz) =>
        figureDb + 20 * Math.Log10(megahertz) + 10 * Math.Log10(bandwidthHz) - 95.5;

    /// <summary>Power of noise at a lossless antenna, dBm.</summary>
    /// <remarks>Boltzmann's constant times 290 K is -174 dBm in one hertz.</remarks>
    public static double PowerDbm(double figureDb, double bandwidthHz) => figureDb + 10 * Math.Log10(bandwidthHz) - 174;

    // Invented: P.372 has charts for it and no formula. Thunderstorms in the tropics and in summer, heard farther by night.
    private static double AtmosphericDb(double megahertz, double cosZenith, double tropical, double summer)
    {
        var night = DemoControlPoint.Smooth((float)-cosZenith, -0.15f, 0.25f);
        return 50 + 16 * night + 10 * tropical + 5 * summer - 30 * Math.Log10(megahertz);
    }

    private static double Power(double decibels) => Math.Pow(10, decibels / 10);
}
