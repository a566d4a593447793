namespace Bandtide.Core.Sheets;

/// <summary>What a station reports for one UTC date.</summary>
/// <param name="Date">The UTC date.</param>
/// <param name="Cells">At least one cell.</param>
public sealed record DaySheet(DateOnly Date, CellGrid Cells);
