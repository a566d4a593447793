using Bandtide.Core.Sheets;

namespace Bandtide.Storage.Days;

/// <summary>A valid sheet that waits to be stored, with the warnings its reader gave.</summary>
public sealed record PendingDay(DaySheet Sheet, IReadOnlyList<SheetWarning> ReaderWarnings);
