using Bandtide.Core.Sheets;

namespace Bandtide.Storage.Days;

/// <summary>What an upload of one day returns: what was stored, which revision, every warning.</summary>
/// <param name="Station">Code of the station.</param>
/// <param name="Date">UTC date.</param>
/// <param name="Status">What storing did.</param>
/// <param name="Revision">The revision that is current now, from 1.</param>
/// <param name="Cells">Cells of the sheet sent.</param>
/// <param name="Checksum">Equal exactly when the rounded cells are.</param>
/// <param name="Warnings">At most 10, one per rule.</param>
public sealed record DayReceipt(
    string Station, DateOnly Date, DayStatus Status, int Revision, int Cells, string Checksum, IReadOnlyList<SheetWarning> Warnings);
