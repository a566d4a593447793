using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>The values of one cell that occur, ascending, and what is known of each.</summary>
/// <param name="Values">Ascending.</param>
/// <param name="Slots">As many.</param>
internal sealed record ValueTable(int[] Values, ValueSlot[] Slots)
{
    /// <summary>The quantile of all occurrences, equal values standing in order of weight; NaN without a value.</summary>
    public double Quantile(double probability)
    {
        if (Values.Length == 0)
        {
            return double.NaN;
        }

        // Of equal values only the outermost midpoints matter, so at most three points stand for all.
        var points = new double[3 * Values.Length];
        var weights = new double[points.Length];
        var count = 0;
        for (var i = 0; i < Values.Length; i++)
        {
            var (lightest, heaviest) = (Slots[i].Lightest, Slots[i].Heaviest);
            Span<double> parts = Slots[i].Weight < 1.5 * lightest ? [Slots[i].Weight]
                : [lightest, Math.Max(0, Slots[i].Weight - lightest - heaviest), heaviest];
            foreach (var weight in parts)
            {
                (points[count], weights[count++]) = (Values[i], weight);
            }
        }

        return WeightedQuantiles.Of(probability, points.AsSpan(0, count), weights.AsSpan(0, count));
    }
}
