namespace Bandtide.Storage.Days;

/// <summary>What is current for a date, without its cells.</summary>
/// <param name="Revision">From 1.</param>
/// <param name="Checksum"><c>null</c> when the day is withdrawn.</param>
internal sealed record DayHead(int Revision, byte[]? Checksum);
