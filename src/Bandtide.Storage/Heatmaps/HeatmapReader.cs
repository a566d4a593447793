using Bandtide.Core.Heatmaps;

using Bandtide.Storage.Engine;
using Bandtide.Storage.Network;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Answers heatmap queries from month tiles, or from day sheets where the question needs them.</summary>
public sealed class HeatmapReader
{
    internal HeatmapReader(StoreDatabase database, NetworkStore network, StoreOptions options) { }

    /// <summary>The revision alone, cheap: what an <c>ETag</c> is made of. <c>null</c>: no such station or region.</summary>
    public Task<string?> RevisionAsync(HeatmapQuery query, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>The heatmap.</summary>
    public Task<HeatmapOutcome> ReadAsync(HeatmapQuery query, CancellationToken ct) => throw new NotSupportedException("Not built yet.");
}
