using Bandtide.Server.Demo;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components;

/// <summary>What every page has to say about the data it shows.</summary>
internal sealed class SiteFacts(NetworkStore network)
{
    /// <summary>Code of the region that marks a store as filled with the invented scenario: it lives and goes with that data.</summary>
    public const string DemonstrationRegion = DemoScenario.Region;

    private volatile bool isDemonstration;

    /// <summary>Whether the store is known to hold the invented demonstration scenario; asked at no cost.</summary>
    public bool IsKnownDemonstration => isDemonstration;

    /// <summary>Whether the store holds the invented demonstration scenario.</summary>
    public async Task<bool> IsDemonstrationAsync(CancellationToken ct) =>
        isDemonstration = (await network.GetAsync(ct)).FindRegion(DemonstrationRegion) is not null;
}
