using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;

namespace Bandtide.Core.Packing;

/// <summary>Unpacks eight bit-packed values at a time with vector instructions.</summary>
/// <remarks>
/// Eight values of w bits take exactly w bytes, so each group begins at a byte. Per half group: one load of 16 bytes, one
/// shuffle that brings the four bytes of each value into its lane, then a shift by a different count in each lane, done as a
/// multiplication by 2^(7 - shift) followed by a common shift of 7, which holds for widths up to 25.
/// </remarks>
internal static class BitLanes
{
    private const int MaxWidth = 25;
    private const int Group = 8;
    private static readonly Half[] Halves = [.. Enumerable.Range(0, 2 * (MaxWidth + 1)).Select(n => Half.Of(n / 2, n % 2))];

    /// <summary>Unpacks as many whole groups as the source allows to load.</summary>
    /// <returns>Number of values unpacked; the caller does the rest.</returns>
    public static int Unpack(ReadOnlySpan<byte> source, Span<int> target, int least, int width)
    {
        if (!Vector128.IsHardwareAccelerated || width > MaxWidth)
        {
            return 0;
        }

        ref readonly var low = ref Halves[2 * width];
        ref readonly var high = ref Halves[2 * width + 1];
        var mask = Vector128.Create((1u << width) - 1);
        var add = Vector128.Create(least).AsUInt32();
        var done = 0;
        for (var at = 0; done + Group <= target.Length && at + high.Start + Vector128<byte>.Count <= source.Length; at += width)
        {
            low.Unpack(source[at..], mask, add).CopyTo(target[done..]);
            high.Unpack(source[at..], mask, add).CopyTo(target[(done + Group / 2)..]);
            done += Group;
        }

        return done;
    }

    // How four neighbouring values of a group are brought into lanes.
    private readonly record struct Half(int Start, Vector128<byte> Bytes, Vector128<uint> Factors)
    {
        public static Half Of(int width, int half)
        {
            var first = half * 4 * width;
            var start = first / 8;
            Span<byte> bytes = stackalloc byte[16];
            Span<uint> factors = stackalloc uint[4];
            for (var lane = 0; lane < factors.Length; lane++)
            {
                var bit = first + lane * width - start * 8;
                for (var n = 0; n < 4; n++)
                {
                    bytes[4 * lane + n] = (byte)(bit / 8 + n);
                }

                factors[lane] = 1u << (7 - bit % 8);
            }

            return new(start, Vector128.Create<byte>(bytes), Vector128.Create<uint>(factors));
        }

        [MethodImpl(MethodImplOptions.AggressiveInlining)]
        public Vector128<int> Unpack(ReadOnlySpan<byte> group, Vector128<uint> mask, Vector128<uint> add)
        {
            var words = Vector128.ShuffleNative(Vector128.Create(group[Start..]), Bytes).AsUInt32();
            return ((((words * Factors) >>> 7) & mask) + add).AsInt32();
        }
    }
}
