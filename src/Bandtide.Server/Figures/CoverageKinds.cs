using System.Numerics;
using Bandtide.Storage.Coverage;

namespace Bandtide.Server.Figures;

/// <summary>Reads what can be said of a station's day.</summary>
internal static class CoverageKinds
{
    /// <summary>Hours of the day with at least one cell, 0 to 24.</summary>
    public static int Hours(this CoverageDay day) => BitOperations.PopCount((uint)day.HoursMask);

    /// <summary>What can be said of a day.</summary>
    public static CoverageKind Kind(this CoverageDay? day) => day switch
    {
        null => CoverageKind.NotReported,
        { IsWithdrawn: true } => CoverageKind.Withdrawn,
        { } sent when sent.Hours() == 24 => CoverageKind.Complete,
        _ => CoverageKind.Partial,
    };
}
