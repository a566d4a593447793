namespace Bandtide.Storage.Days;

/// <summary>The current row of a day, ready to be written.</summary>
/// <param name="Date">Days since 1970-01-01.</param>
/// <param name="Revision">From 1.</param>
/// <param name="ReceivedAt">Unix milliseconds, UTC.</param>
/// <param name="Sheet">The packed cells, or <c>null</c> for a withdrawal.</param>
internal sealed record DayEntry(int Date, int Revision, long ReceivedAt, PackedSheet? Sheet);
