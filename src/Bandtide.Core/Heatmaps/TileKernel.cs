using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace Bandtide.Core.Heatmaps;

/// <summary>The inner loops over tiles, eight cells at a time.</summary>
internal static class TileKernel
{
    private const int Lanes = 8;

    /// <summary>Adds the means of one station's tile: its only month.</summary>
    /// <param name="days">Days of each cell.</param>
    /// <param name="sums">Sums over the days.</param>
    /// <param name="votes">What they are added to.</param>
    /// <param name="at">First cell of <paramref name="votes"/>.</param>
    /// <param name="minDays">Cells with fewer days are left out, at least 1.</param>
    public static void AddMeans(ReadOnlySpan<byte> days, ReadOnlySpan<int> sums, VotePlanes votes, int at, int minDays)
    {
        sums = sums[..days.Length];
        ref var means = ref votes.Sums.AsSpan(at, days.Length).AsRef();
        ref var stations = ref votes.Stations.AsSpan(at, days.Length).AsRef();
        ref var totals = ref votes.Days.AsSpan(at, days.Length).AsRef();
        var least = Vector256.Create(minDays);
        var i = 0;
        for (; i <= days.Length - Lanes; i += Lanes)
        {
            var count = LoadBytes(in days[i]);
            var kept = Vector256.GreaterThanOrEqual(count, least);
            count &= kept;
            var sum = Vector256.LoadUnsafe(in sums[i]) & kept;
            // A sum of at most 31 x 60,000 is exact in single precision; the division is not, so it is done in double.
            var (sumLow, sumHigh) = Vector256.Widen(Vector256.ConvertToSingle(sum));
            var (divisorLow, divisorHigh) = Vector256.Widen(Vector256.ConvertToSingle(Vector256.Max(count, Vector256<int>.One)));
            Add(ref Unsafe.Add(ref means, i), sumLow / divisorLow);
            Add(ref Unsafe.Add(ref means, i + 4), sumHigh / divisorHigh);
            Add(ref Unsafe.Add(ref stations, i), -kept);
            Add(ref Unsafe.Add(ref totals, i), count);
        }

        for (; i < days.Length; i++)
        {
            if (days[i] >= minDays)
            {
                Unsafe.Add(ref means, i) += (double)sums[i] / days[i];
                Unsafe.Add(ref stations, i)++;
                Unsafe.Add(ref totals, i) += days[i];
            }
        }
    }

    /// <summary>Adds one month of a station that has several.</summary>
    public static void AddMonth(ReadOnlySpan<byte> days, ReadOnlySpan<int> sums, Span<int> stationDays, Span<double> stationSums)
    {
        for (var i = 0; i < days.Length; i++)
        {
            stationDays[i] += days[i];
            stationSums[i] += sums[i];
        }
    }

    /// <summary>Adds the means of a station over several months.</summary>
    public static void AddMeans(ReadOnlySpan<int> days, ReadOnlySpan<double> sums, VotePlanes votes, int minDays)
    {
        for (var i = 0; i < days.Length; i++)
        {
            if (days[i] >= minDays)
            {
                votes.Sums[i] += sums[i] / days[i];
                votes.Stations[i]++;
                votes.Days[i] += days[i];
            }
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<int> LoadBytes(ref readonly byte first)
    {
        var words = Vector128.WidenLower(Vector128.CreateScalar(Unsafe.ReadUnaligned<ulong>(in first)).AsByte());
        return Vector256.Create(Vector128.WidenLower(words), Vector128.WidenUpper(words)).AsInt32();
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void Add<T>(ref T target, Vector256<T> addend) => (Vector256.LoadUnsafe(ref target) + addend).StoreUnsafe(ref target);

    private static ref T AsRef<T>(this Span<T> span) => ref MemoryMarshal.GetReference(span);
}
