using Bandtide.Core.Sheets;

namespace Bandtide.Core.Heatmaps;

/// <summary>Everything that is particular to one measure.</summary>
/// <param name="Measure">The measure.</param>
/// <param name="Code">Its word on the wire and in addresses.</param>
/// <param name="Label">Its name for people.</param>
/// <param name="Meaning">One sentence for people.</param>
/// <param name="Quantity">Where a cell holds it; for excess, the quantity the floor is taken from.</param>
/// <param name="Decimals">Decimal places of its stored resolution: 4 for shares, 2 for decibels.</param>
/// <param name="IsGainDependent">Whether it is a level in the station's own unit, which other units cannot be compared with.</param>
public sealed record MeasureInfo(
    Measure Measure, string Code, string Label, string Meaning, Quantity Quantity, int Decimals, bool IsGainDependent)
{
    /// <summary>Whether it is a share from 0 to 1.</summary>
    public bool IsShare => Decimals == 4;

    /// <summary>Whether it is a difference of two quantities, computed and not stored.</summary>
    public bool IsDifference => Measure == Measure.Excess;

    /// <summary>Size of one stored unit.</summary>
    public double Resolution => IsShare ? 1e-4 : 1e-2;

    /// <summary>Number of stored units in one unit: dividing by it gives the nearest number to the decimal one.</summary>
    public int StepsPerUnit => IsShare ? 10_000 : 100;
}
