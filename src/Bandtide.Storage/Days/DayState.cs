namespace Bandtide.Storage.Days;

/// <summary>What the store holds about dates that are to be written.</summary>
/// <param name="Heads">What is current, by date, for dates that have anything.</param>
/// <param name="EarliestCopies">The earliest other date with each checksum, by checksum text.</param>
internal sealed record DayState(IReadOnlyDictionary<int, DayHead> Heads, IReadOnlyDictionary<string, int> EarliestCopies);
