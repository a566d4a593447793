using Bandtide.Core.Bands;

namespace Bandtide.Core.Sheets;

/// <summary>The band codes of a grid.</summary>
internal static class CellCodes
{
    /// <summary>One code per band of the grid.</summary>
    /// <exception cref="ArgumentException">A band is not in the plan.</exception>
    public static string[] CodesOf(this BandPlan plan, CellGrid cells)
    {
        var codes = new string[cells.BandCount];
        for (var b = 0; b < codes.Length; b++)
        {
            codes[b] = plan.ById(cells.BandIds[b])?.Code ?? throw new ArgumentException($"No band has identity {cells.BandIds[b]}.", nameof(plan));
        }

        return codes;
    }
}
