namespace Bandtide.Core.Sheets;

/// <summary>One day of a body that holds many.</summary>
/// <param name="DateText">The date as it was written, or the unreadable text, cut when long.</param>
/// <param name="Date">The date, or <c>null</c> when it could not be read.</param>
/// <param name="Reading">The sheet or why it is refused.</param>
/// <param name="Bytes">Size of its text, bytes.</param>
public sealed record BulkDay(string DateText, DateOnly? Date, SheetReading Reading, int Bytes);
