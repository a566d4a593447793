namespace Bandtide.Server.Figures;

/// <summary>Heights of the cells of a heatmap, in pixels.</summary>
/// <param name="Row">Height of a row, the gap below its cells included.</param>
/// <param name="Gap">Gap below the cells of a row.</param>
/// <param name="Dot">Radius of the dot of few data.</param>
internal sealed record CellSize(int Row, int Gap, double Dot)
{
    /// <summary>A heatmap of its own.</summary>
    public static CellSize Large { get; } = new(HeatmapGeometry.RowHeight, HeatmapGeometry.RowGap, 2.2);

    /// <summary>One of twelve months.</summary>
    public static CellSize Small { get; } = new(6, 0, 0.9);
}
