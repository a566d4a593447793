using System.Diagnostics.CodeAnalysis;

namespace Bandtide.Core.Bands;

/// <summary>Outcome of adding bands to a plan: the larger plan, or every reason against it.</summary>
/// <param name="Plan">The larger plan, or <c>null</c> where there are problems.</param>
/// <param name="Problems">Empty when the bands were accepted.</param>
public sealed record BandPlanExtension(BandPlan? Plan, IReadOnlyList<BandPlanProblem> Problems)
{
    /// <summary>Whether all bands were accepted.</summary>
    [MemberNotNullWhen(true, nameof(Plan))]
    public bool IsAccepted => Plan is not null;
}
