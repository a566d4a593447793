using Bandtide.Core.Time;
using Bandtide.Storage.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>One month among the twelve of a year.</summary>
/// <param name="Month">The month.</param>
/// <param name="Answer">Its answer.</param>
/// <param name="Rows">Cells for the bands of the whole year, from top to bottom; a band without data that month has none.</param>
public sealed record MonthPlate(YearMonth Month, HeatmapAnswer Answer, IReadOnlyList<HeatmapRow> Rows);
