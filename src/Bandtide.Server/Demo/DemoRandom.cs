namespace Bandtide.Server.Demo;

/// <summary>Chance that depends on nothing but its seed: the same on every machine and in every order of asking.</summary>
/// <remarks>SplitMix64: Steele, Lea and Flood (2014), Fast Splittable Pseudorandom Number Generators, OOPSLA.</remarks>
internal struct DemoRandom(ulong seed)
{
    private const int GaussBits = 10;
    private const ulong Increment = 0x9E3779B97F4A7C15;
    private static readonly float[] Gauss = [.. Enumerable.Range(0, 1 << GaussBits).Select(i => (float)NormalQuantile((i + 0.5) / (1 << GaussBits)))];

    private ulong state = seed;

    /// <summary>One of many independent sequences: for a purpose, and for a day or another number.</summary>
    public static DemoRandom Of(ulong purpose, int number) => new(Mix(purpose * 0xD1B54A32D192ED03 + (ulong)(uint)number));

    /// <summary>A purpose from a text, so that a station's chance does not depend on its place in the list.</summary>
    public static ulong Purpose(string text)
    {
        // FNV-1a, 64 bits.
        var hash = 14695981039346656037UL;
        foreach (var c in text)
        {
            hash = (hash ^ c) * 1099511628211UL;
        }

        return hash;
    }

    /// <summary>64 bits.</summary>
    public ulong Next() => Mix(state += Increment);

    /// <summary>From 0 up to but not including 1.</summary>
    public double Share() => (Next() >> 11) * (1.0 / (1UL << 53));

    /// <summary>Normal with mean 0 and standard deviation 1, cut at about 3.3.</summary>
    public float Normal() => NormalOf(Next());

    /// <summary>A normal number from the lowest ten bits.</summary>
    public static float NormalOf(ulong bits) => Gauss[bits & ((1 << GaussBits) - 1)];

    /// <summary>
    /// A normal number for a day that resembles its neighbours: lag-1 correlation 0.6, as a moving sum over the ten days
    /// before, so that no day needs a beginning to count from.
    /// </summary>
    public static float Anomaly(ulong purpose, int day)
    {
        const float Correlation = 0.6f;
        const int Memory = 10;
        var (sum, weight) = (0f, 0.8f);
        for (var back = 0; back <= Memory; back++, weight *= Correlation)
        {
            sum += weight * Of(purpose, day - back).Normal();
        }

        return sum;
    }

    /// <summary>Quantile of the normal distribution, good to three digits.</summary>
    /// <remarks>Abramowitz and Stegun (1964), formula 26.2.23.</remarks>
    public static double NormalQuantile(double probability)
    {
        var tail = Math.Min(probability, 1 - probability);
        var t = Math.Sqrt(-2 * Math.Log(tail));
        var z = t - (2.515517 + 0.802853 * t + 0.010328 * t * t) / (1 + 1.432788 * t + 0.189269 * t * t + 0.001308 * t * t * t);
        return probability < 0.5 ? -z : z;
    }

    private static ulong Mix(ulong z)
    {
        z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return z ^ (z >> 31);
    }
}
