using System.Globalization;
using Bandtide.Core.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>How values of one measure become words and places on the colour scale.</summary>
/// <param name="Ticks">Ascending values, the first and last being the ends of the scale.</param>
/// <param name="IsShare">Whether values are shares of one, which people read in per cent.</param>
/// <param name="Unit">Unit of what <see cref="Number"/> writes: <c>%</c>, <c>dB</c> or the stations' level unit.</param>
public sealed record ValueScale(IReadOnlyList<double> Ticks, bool IsShare, string Unit)
{
    private const int MostIntervals = 6;

    /// <summary>Value at the lowest colour.</summary>
    public double Low => Ticks[0];

    /// <summary>Value at the highest colour.</summary>
    public double High => Ticks[^1];

    /// <summary>
    /// The scale for one or several heatmaps of a measure: all of 0 to 100 % for shares, so that any two months may be
    /// compared by eye; round numbers around the values for decibels; from nought for a spread.
    /// </summary>
    /// <param name="measure">The measure.</param>
    /// <param name="statistic">The statistic.</param>
    /// <param name="unit">Unit as the answer gives it.</param>
    /// <param name="values">All values to be shown; NaN is passed over.</param>
    public static ValueScale For(Measure measure, Statistic statistic, string unit, IEnumerable<double> values)
    {
        var isShare = measure.Info().IsShare;
        var shown = isShare ? "%" : unit;
        if (isShare && statistic != Statistic.Sd)
        {
            return new([0, 0.2, 0.4, 0.6, 0.8, 1], true, shown);
        }

        var finite = values.Where(double.IsFinite).ToList();
        var (low, high) = finite.Count == 0 ? (0, 1) : (finite.Min(), finite.Max());
        return new(NiceTicks.Enclosing(statistic == Statistic.Sd ? 0 : low, high, MostIntervals), isShare, shown);
    }

    /// <summary>Place of a value on the colour scale, 0 to 1.</summary>
    public double Place(double value) => Math.Clamp((value - Low) / (High - Low), 0, 1);

    /// <summary>A value without its unit, to one decimal, with a true minus sign.</summary>
    public string Number(double value) => Signed(value, IsShare ? value * 100 : value, "0.0");

    /// <summary>A value with its unit.</summary>
    public string Text(double value) => $"{Number(value)} {Unit}";

    /// <summary>A tick without its unit, with no more decimals than it needs.</summary>
    public string Tick(double value) => Signed(value, IsShare ? value * 100 : value, "0.##");

    private static string Signed(double value, double shown, string format)
    {
        var text = Math.Abs(shown).ToString(format, CultureInfo.InvariantCulture);
        return value < 0 && text.AsSpan().ContainsAnyExcept("0.") ? "−" + text : text;
    }
}
