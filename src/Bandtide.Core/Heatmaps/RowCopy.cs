namespace Bandtide.Core.Heatmaps;

/// <summary>A stretch of cells that lie side by side both in a station's planes and in the pool's.</summary>
/// <param name="Source">First cell in the station's.</param>
/// <param name="Target">First cell in the pool's.</param>
/// <param name="Length">Number of cells.</param>
internal readonly record struct RowCopy(int Source, int Target, int Length);
