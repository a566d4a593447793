using Bandtide.Core.Bands;

namespace Bandtide.Storage.Network;

/// <summary>What adding a band gives.</summary>
public abstract record BandAddition
{
    private BandAddition()
    {
    }

    /// <summary>The band exists now, for every station.</summary>
    public sealed record Added(Band Band) : BandAddition;

    /// <summary>It cannot join the plan.</summary>
    public sealed record Refused(IReadOnlyList<BandPlanProblem> Problems) : BandAddition;
}
