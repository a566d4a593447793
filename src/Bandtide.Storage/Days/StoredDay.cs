using Bandtide.Core.Sheets;

namespace Bandtide.Storage.Days;

/// <summary>One revision of a day as it stands in the store.</summary>
/// <param name="Date">UTC date.</param>
/// <param name="Revision">From 1.</param>
/// <param name="Checksum">Checksum of the cells; empty for a withdrawal.</param>
/// <param name="Cells">Number of cells; 0 for a withdrawal.</param>
/// <param name="ReceivedAt">When it was stored, UTC.</param>
/// <param name="Sheet">The cells, or <c>null</c> for a withdrawal or where only the entry was asked for.</param>
/// <param name="IsWithdrawal">Whether this revision withdraws the day.</param>
public sealed record StoredDay(
    DateOnly Date, int Revision, string Checksum, int Cells, DateTimeOffset ReceivedAt, CellGrid? Sheet, bool IsWithdrawal);
