namespace Bandtide.Server.Demo;

/// <summary>Absorption in the D region.</summary>
/// <remarks>
/// The law of NOAA's D-region absorption product: the highest frequency that loses 1 dB on a vertical path up and back is
/// (10 log10 F + 65) cos^0.75 chi MHz for an X-ray flux F in W/m2 and a solar zenith angle chi; other frequencies lose
/// (that frequency / f)^1.5 dB. The undisturbed D region is drawn by the same law with an invented limit.
/// </remarks>
internal static class DemoAbsorption
{
    // cos^0.75 to the power 1.5.
    private const float CosineExponent = 0.75f * 1.5f;
    private const int Steps = 1024;
    private static readonly float[] Cosine = [.. Enumerable.Range(0, Steps + 1).Select(i => MathF.Pow(i / (float)Steps, CosineExponent))];

    /// <summary>Limit of 1 dB under a quiet Sun overhead, MHz, to the power 1.5. Invented so that 80 m closes at noon.</summary>
    public static float QuietTerm(float activity) => MathF.Pow(15f * (1 + 0.002f * activity), 1.5f);

    /// <summary>Limit of 1 dB under a flare overhead, MHz, to the power 1.5.</summary>
    public static float FlareTerm(double flux) => (float)Math.Pow(Math.Max(0, 10 * Math.Log10(flux) + 65), 1.5);

    /// <summary>What the zenith angle leaves of a term; 0 in darkness.</summary>
    public static float CosineFactor(float cosZenith) => cosZenith <= 0 ? 0 : Cosine[(int)(MathF.Min(1, cosZenith) * Steps)];

    /// <summary>Loss on a vertical path up and back in dB.</summary>
    /// <param name="term">Sum of terms, each limit to the power 1.5.</param>
    /// <param name="cosZenith">Cosine of the solar zenith angle.</param>
    /// <param name="megahertz">Frequency.</param>
    public static float VerticalLossDb(float term, float cosZenith, float megahertz) =>
        term * CosineFactor(cosZenith) * FrequencyFactor(megahertz);

    /// <summary>f^-1.5.</summary>
    public static float FrequencyFactor(float megahertz) => MathF.Pow(megahertz, -1.5f);
}
