using Bandtide.Core.Sheets;

namespace Bandtide.Storage.Days;

/// <summary>A new current revision of a day.</summary>
/// <param name="Entry">The row to write.</param>
/// <param name="Cells">Its cells, or <c>null</c> for a withdrawal.</param>
internal sealed record DayChange(DayEntry Entry, CellGrid? Cells);
