using System.Numerics;

namespace Bandtide.Core.Sheets;

/// <summary>Distances of a plane's values from those of another, where both have one.</summary>
internal static class Distances
{
    /// <summary>Takes the reference from each value.</summary>
    public static void Subtract(Span<int> plane, ReadOnlySpan<int> reference) => Combine(plane, reference, -1);

    /// <summary>Adds the reference to each value; sums that are too large wrap around, as the distances did.</summary>
    public static void Add(Span<int> plane, ReadOnlySpan<int> reference) => Combine(plane, reference, 1);

    private static void Combine(Span<int> plane, ReadOnlySpan<int> reference, int sign)
    {
        if (reference.IsEmpty)
        {
            return;
        }

        var missing = new Vector<int>(CellGrid.Missing);
        var i = 0;
        for (; i + Vector<int>.Count <= plane.Length; i += Vector<int>.Count)
        {
            var value = new Vector<int>(plane[i..]);
            var other = new Vector<int>(reference[i..]);
            var either = Vector.Equals(value, missing) | Vector.Equals(other, missing);
            Vector.ConditionalSelect(either, value, value + other * sign).CopyTo(plane[i..]);
        }

        for (; i < plane.Length; i++)
        {
            if (plane[i] != CellGrid.Missing && reference[i] != CellGrid.Missing)
            {
                plane[i] = unchecked(plane[i] + reference[i] * sign);
            }
        }
    }
}
