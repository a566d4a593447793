using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>The weighted values of one cell: each distinct value with the sum, the least and the largest of its weights.</summary>
/// <param name="Values">Ascending.</param>
/// <param name="Weights">Weight of all occurrences together.</param>
/// <param name="Lightest">Weight of the lightest occurrence.</param>
/// <param name="Heaviest">Weight of the heaviest occurrence.</param>
internal sealed record ValueTable(int[] Values, double[] Weights, double[] Lightest, double[] Heaviest)
{
    /// <summary>The quantile of all occurrences, equal values standing in order of weight.</summary>
    public double Quantile(double probability)
    {
        // Of equal values only the outermost midpoints matter, so at most three stand for all.
        var points = new double[3 * Values.Length];
        var weights = new double[points.Length];
        var count = 0;
        for (var i = 0; i < Values.Length; i++)
        {
            Span<double> parts = Weights[i] == Lightest[i] ? [Weights[i]]
                : [Lightest[i], Math.Max(0, Weights[i] - Lightest[i] - Heaviest[i]), Heaviest[i]];
            foreach (var weight in parts)
            {
                (points[count], weights[count++]) = (Values[i], weight);
            }
        }

        return WeightedQuantiles.Of(probability, points.AsSpan(0, count), weights.AsSpan(0, count));
    }
}
