namespace Bandtide.Server.Figures;

/// <summary>Round numbers for a scale.</summary>
internal static class NiceTicks
{
    private static readonly double[] Factors = [1, 2, 5, 10];

    /// <summary>Ticks at multiples of 1, 2 or 5 times a power of ten that enclose a range.</summary>
    /// <param name="low">Least value, finite.</param>
    /// <param name="high">Greatest value, finite, not below <paramref name="low"/>.</param>
    /// <param name="most">Largest number of intervals, at least 2.</param>
    /// <returns>At least two ticks; the first is not above <paramref name="low"/>, the last not below <paramref name="high"/>.</returns>
    public static IReadOnlyList<double> Enclosing(double low, double high, int most)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(low, high);
        ArgumentOutOfRangeException.ThrowIfLessThan(most, 2);
        var span = Math.Max(high - low, Math.Max(Math.Abs(high), 1) * 1e-3);
        var power = Math.Pow(10, Math.Floor(Math.Log10(span / most)));
        foreach (var step in Factors.Concat(Factors.Select(factor => 10 * factor)).Select(factor => factor * power))
        {
            var (first, last) = (Math.Floor(low / step + 1e-9), Math.Ceiling(high / step - 1e-9));
            last = Math.Max(last, first + 1);
            if (last - first <= most)
            {
                return [.. Enumerable.Range(0, (int)(last - first) + 1).Select(i => Math.Round((first + i) * step, 10))];
            }
        }

        throw new InvalidOperationException("A hundredfold step always suffices.");
    }
}
