namespace Bandtide.Core.Heatmaps;

/// <summary>What is known of one value of one cell. An occurrence that is one of n has the weight 1/n. <c>default</c>: does not occur.</summary>
/// <param name="Weight">Weight of all occurrences together.</param>
/// <param name="Largest">The largest n among them: the lightest occurrence.</param>
/// <param name="Smallest">The smallest n among them, counted down from <see cref="int.MaxValue"/>: the heaviest.</param>
internal record struct ValueSlot(double Weight, int Largest, int Smallest)
{
    /// <summary>Weight of the lightest occurrence.</summary>
    public readonly double Lightest => 1.0 / Largest;

    /// <summary>Weight of the heaviest occurrence.</summary>
    public readonly double Heaviest => 1.0 / (int.MaxValue - Smallest);

    /// <summary>Adds an occurrence that is one of n.</summary>
    /// <param name="n">At least 1.</param>
    /// <param name="weight">1/n.</param>
    public void Add(int n, double weight)
    {
        Weight += weight;
        Largest = Math.Max(Largest, n);
        Smallest = Math.Max(Smallest, int.MaxValue - n);
    }
}
