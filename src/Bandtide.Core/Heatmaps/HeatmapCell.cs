namespace Bandtide.Core.Heatmaps;

/// <summary>One cell of a heatmap.</summary>
/// <param name="Value">The statistic in the measure's unit, or NaN where nothing was observed (or an sd of under two).</param>
/// <param name="Lower">Lower end of the 95 % interval of the mean, or NaN.</param>
/// <param name="Upper">Upper end of the 95 % interval of the mean, or NaN.</param>
/// <param name="Stations">Stations that reported the measure here.</param>
/// <param name="Days">Station-days that reported the measure here.</param>
public readonly record struct HeatmapCell(double Value, double Lower, double Upper, int Stations, int Days);
