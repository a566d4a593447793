using Bandtide.Core.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>What a reader must be able to tell apart in a heatmap.</summary>
internal enum CellState
{
    /// <summary>Nobody observed it: hatched, no colour.</summary>
    NotObserved,

    /// <summary>A value.</summary>
    Observed,

    /// <summary>A value, or for a spread none, from fewer than five station-days: a dot.</summary>
    FewData,
}

