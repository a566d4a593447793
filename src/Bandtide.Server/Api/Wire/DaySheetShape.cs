namespace Bandtide.Server.Api;

/// <summary>A day sheet as JSON, for the API's description.</summary>
/// <param name="Date">UTC date.</param>
/// <param name="Cells">The cells.</param>
public sealed record DaySheetShape(string Date, IReadOnlyList<CellShape> Cells);
