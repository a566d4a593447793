namespace Bandtide.Server.Demo;

/// <summary>The F layer, which sends high frequencies back to the ground.</summary>
internal static class DemoLayer
{
    private const int Steps = 1024;
    private const float NightKept = 0.81f;
    private static readonly float[] LightTable =
        [.. Enumerable.Range(0, Steps + 1).Select(i => MathF.Pow(Math.Max(0, (i * 2f / Steps) - 1 + 0.10f) / 1.10f, 0.55f))];

    /// <summary>
    /// How strongly the Sun has built the layer, 0 to 1: an hour late, and fading slowly after sunset. Invented; the cosine law
    /// of a Chapman layer (Davies 1990, Ionospheric Radio, chapter 3, from memory) would give the exponent 0.5 in equilibrium.
    /// </summary>
    /// <param name="cosZenith">24 cosines of the solar zenith angle.</param>
    /// <param name="light">Receives 24 values.</param>
    public static void Light(ReadOnlySpan<float> cosZenith, Span<float> light)
    {
        // Twice around the clock, so that the evening before is remembered.
        var kept = 0f;
        for (var step = 0; step < 48; step++)
        {
            var hour = step % 24;
            kept = Math.Max(LightTable[(int)((cosZenith[(hour + 23) % 24] + 1) * (Steps / 2f))], kept * NightKept);
            light[hour] = kept;
        }
    }

    /// <summary>Critical frequency in MHz at middle latitude. Invented: about 4 by night and 11 by day when the Sun is active.</summary>
    public static float CriticalMegahertz(float light, float activity) => (2.4f + 4.4f * light) * (1 + 0.0055f * activity);

    /// <summary>By how much the highest frequency of a hop exceeds the critical frequency.</summary>
    /// <param name="hopKilometres">Length of the hop over the ground.</param>
    /// <remarks>Secant law for a thin layer 300 km high above a round Earth (Davies 1990, chapter 6, from memory), at most 3.3.</remarks>
    public static float ObliquityFactor(double hopKilometres)
    {
        const double Height = 300;
        const double Radius = 6371;
        var half = hopKilometres / 2 / Radius;
        var incidence = Math.Atan2(Radius * Math.Sin(half), Height + Radius * (1 - Math.Cos(half)));
        return (float)Math.Min(3.3, 1 / Math.Cos(incidence));
    }
}
