using Bandtide.Core.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>Reads the state of a cell.</summary>
internal static class CellStates
{
    /// <summary>The state of a cell. A cell with reports but without a value (a spread of under two) is few data.</summary>
    public static CellState State(this HeatmapCell cell) => cell.Days == 0
        ? CellState.NotObserved
        : cell.Days < Heatmap.FewDays || double.IsNaN(cell.Value) ? CellState.FewData : CellState.Observed;
}
