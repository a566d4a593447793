using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>One row of a heatmap: a band with its 24 cells.</summary>
/// <param name="Band">The band.</param>
/// <param name="Cells">One cell per hour of the clock.</param>
public sealed record HeatmapRow(Band Band, IReadOnlyList<HeatmapCell> Cells);
