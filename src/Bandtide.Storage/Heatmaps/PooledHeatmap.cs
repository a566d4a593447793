using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;

namespace Bandtide.Storage.Heatmaps;

/// <summary>A heatmap and the stations that had data for it.</summary>
internal sealed record PooledHeatmap(Heatmap Heatmap, IReadOnlyList<Station> Stations);
