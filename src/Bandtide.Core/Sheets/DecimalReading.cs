namespace Bandtide.Core.Sheets;

/// <summary>A decimal number as whole units of its resolution.</summary>
/// <param name="Status">Whether it is a number.</param>
/// <param name="Units">Whole units, cut towards zero; <see cref="long.MaxValue"/> in size when too large.</param>
/// <param name="Tail">What was cut, with the number's sign: 0 nothing, 1 less than half a unit, 2 half or more.</param>
internal readonly record struct DecimalReading(DecimalStatus Status, long Units, int Tail)
{
    /// <summary>Half away from zero.</summary>
    public long Rounded => Units + (Tail / 2);

    /// <summary>Below 0 when the first is less, above 0 when it is greater; both read at the same resolution.</summary>
    public static int Compare(DecimalReading a, DecimalReading b) =>
        a.Units != b.Units ? a.Units.CompareTo(b.Units) : a.Tail.CompareTo(b.Tail);

    /// <summary>Whether the number as it was written lies in a range of units, both ends included.</summary>
    public bool Within(long low, long high) =>
        (Units > low || (Units == low && Tail >= 0)) && (Units < high || (Units == high && Tail <= 0));
}
