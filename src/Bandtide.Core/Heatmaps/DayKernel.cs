using System.Runtime.Intrinsics;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Heatmaps;

/// <summary>The inner loops over days, eight cells at a time. Spans are cut to the length of the first, and must not be shorter.</summary>
internal static class DayKernel
{
    private const int Lanes = 8;

    private static Vector256<int> Missing => Vector256.Create(CellGrid.Missing);

    /// <summary>Differences of the cells that have both values.</summary>
    public static void Subtract(ReadOnlySpan<int> values, ReadOnlySpan<int> subtrahends, Span<int> differences)
    {
        subtrahends = subtrahends[..values.Length];
        differences = differences[..values.Length];
        var i = 0;
        for (; i <= values.Length - Lanes; i += Lanes)
        {
            var (value, subtrahend) = (Vector256.LoadUnsafe(in values[i]), Vector256.LoadUnsafe(in subtrahends[i]));
            var absent = Vector256.Equals(value, Missing) | Vector256.Equals(subtrahend, Missing);
            Vector256.ConditionalSelect(absent, Missing, value - subtrahend).StoreUnsafe(ref differences[i]);
        }

        for (; i < values.Length; i++)
        {
            var absent = values[i] == CellGrid.Missing || subtrahends[i] == CellGrid.Missing;
            differences[i] = absent ? CellGrid.Missing : values[i] - subtrahends[i];
        }
    }

    /// <summary>Takes out the cells with too few sweeps.</summary>
    public static void DropFew(Span<int> row, ReadOnlySpan<int> sweeps, int minSweeps)
    {
        sweeps = sweeps[..row.Length];
        var i = 0;
        for (; i <= row.Length - Lanes; i += Lanes)
        {
            var few = Vector256.LessThan(Vector256.LoadUnsafe(in sweeps[i]), Vector256.Create(minSweeps));
            Vector256.ConditionalSelect(few, Missing, Vector256.LoadUnsafe(in row[i])).StoreUnsafe(ref row[i]);
        }

        for (; i < row.Length; i++)
        {
            row[i] = sweeps[i] < minSweeps ? CellGrid.Missing : row[i];
        }
    }

    /// <summary>Widens the range of each cell to hold a day's values.</summary>
    public static void AddExtremes(ReadOnlySpan<int> row, Span<int> lows, Span<int> highs)
    {
        lows = lows[..row.Length];
        highs = highs[..row.Length];
        var i = 0;
        for (; i <= row.Length - Lanes; i += Lanes)
        {
            // The mark of a missing value is the least of all numbers: it never raises a high, and is kept from the lows.
            var value = Vector256.LoadUnsafe(in row[i]);
            var low = Vector256.ConditionalSelect(Vector256.Equals(value, Missing), Vector256.Create(int.MaxValue), value);
            Vector256.Min(Vector256.LoadUnsafe(in lows[i]), low).StoreUnsafe(ref lows[i]);
            Vector256.Max(Vector256.LoadUnsafe(in highs[i]), value).StoreUnsafe(ref highs[i]);
        }

        for (; i < row.Length; i++)
        {
            lows[i] = row[i] == CellGrid.Missing ? lows[i] : Math.Min(lows[i], row[i]);
            highs[i] = Math.Max(highs[i], row[i]);
        }
    }

    /// <summary>Counts the values of a day and sums them.</summary>
    public static void AddDay(ReadOnlySpan<int> row, Span<int> days, Span<int> sums)
    {
        days = days[..row.Length];
        sums = sums[..row.Length];
        var i = 0;
        for (; i <= row.Length - Lanes; i += Lanes)
        {
            var value = Vector256.LoadUnsafe(in row[i]);
            var present = ~Vector256.Equals(value, Missing);
            (Vector256.LoadUnsafe(in days[i]) - present).StoreUnsafe(ref days[i]);
            (Vector256.LoadUnsafe(in sums[i]) + (value & present)).StoreUnsafe(ref sums[i]);
        }

        for (; i < row.Length; i++)
        {
            if (row[i] != CellGrid.Missing)
            {
                days[i]++;
                sums[i] += row[i];
            }
        }
    }

    /// <summary>Adds 1/looks of each value, looks being the sweeps up to a limit.</summary>
    public static void AddInverseLooks(ReadOnlySpan<int> row, ReadOnlySpan<int> sweeps, int mostLooks, Span<float> inverse)
    {
        sweeps = sweeps[..row.Length];
        inverse = inverse[..row.Length];
        var i = 0;
        for (; i <= row.Length - Lanes; i += Lanes)
        {
            var absent = Vector256.Equals(Vector256.LoadUnsafe(in row[i]), Missing);
            var looks = Vector256.Min(Vector256.LoadUnsafe(in sweeps[i]), Vector256.Create(mostLooks));
            var addend = Vector256.AndNot(Vector256<float>.One / Vector256.ConvertToSingle(looks), absent.AsSingle());
            (Vector256.LoadUnsafe(in inverse[i]) + addend).StoreUnsafe(ref inverse[i]);
        }

        for (; i < row.Length; i++)
        {
            if (row[i] != CellGrid.Missing)
            {
                inverse[i] += 1f / Math.Min(sweeps[i], mostLooks);
            }
        }
    }

    /// <summary>Adds one month to the totals of a station.</summary>
    public static void AddMonth(ReadOnlySpan<int> monthDays, ReadOnlySpan<int> monthSums, Span<int> days, Span<double> sums)
    {
        for (var i = 0; i < monthDays.Length; i++)
        {
            days[i] += monthDays[i];
            sums[i] += monthSums[i];
        }
    }

    /// <summary>Adds a day's deviations from the station's month, where every cell has a value.</summary>
    /// <param name="row">The values.</param>
    /// <param name="means">The station's mean in the month.</param>
    /// <param name="deviations">Sums of the deviations of the date.</param>
    /// <param name="squares">Sum of the squared deviations.</param>
    public static void AddFullDeviations(ReadOnlySpan<int> row, ReadOnlySpan<float> means, Span<float> deviations, Span<float> squares)
    {
        means = means[..row.Length];
        deviations = deviations[..row.Length];
        squares = squares[..row.Length];
        var i = 0;
        for (; i <= row.Length - Lanes; i += Lanes)
        {
            var deviation = Vector256.ConvertToSingle(Vector256.LoadUnsafe(in row[i])) - Vector256.LoadUnsafe(in means[i]);
            (Vector256.LoadUnsafe(in deviations[i]) + deviation).StoreUnsafe(ref deviations[i]);
            (Vector256.LoadUnsafe(in squares[i]) + deviation * deviation).StoreUnsafe(ref squares[i]);
        }

        for (; i < row.Length; i++)
        {
            var deviation = row[i] - means[i];
            deviations[i] += deviation;
            squares[i] += deviation * deviation;
        }
    }

    /// <summary>Adds a day's deviations from the station's month to the planes of its date.</summary>
    /// <param name="row">The values.</param>
    /// <param name="means">The station's mean in the month.</param>
    /// <param name="weights">Weight of each of the station's days in a cell; 0 leaves the cell out.</param>
    /// <param name="counts">1 where the month has several days, so that a deviation tells something, else 0.</param>
    /// <param name="date">The planes of the date.</param>
    /// <param name="squares">Sum of the squared deviations.</param>
    public static void AddDeviations(
        ReadOnlySpan<int> row, ReadOnlySpan<float> means, ReadOnlySpan<float> weights, ReadOnlySpan<float> counts, DatePlanes date, Span<float> squares)
    {
        var deviationPlane = date.Deviations.AsSpan(0, row.Length);
        var weightPlane = date.Weights.AsSpan(0, row.Length);
        var countPlane = date.Counts.AsSpan(0, row.Length);
        means = means[..row.Length];
        weights = weights[..row.Length];
        counts = counts[..row.Length];
        squares = squares[..row.Length];
        var i = 0;
        for (; i <= row.Length - Lanes; i += Lanes)
        {
            var value = Vector256.LoadUnsafe(in row[i]);
            var weight = Vector256.LoadUnsafe(in weights[i]);
            var kept = Vector256.AndNot(Vector256.GreaterThan(weight, Vector256<float>.Zero), Vector256.Equals(value, Missing).AsSingle());
            var deviation = (Vector256.ConvertToSingle(value) - Vector256.LoadUnsafe(in means[i])) & kept;
            (Vector256.LoadUnsafe(in deviationPlane[i]) + deviation).StoreUnsafe(ref deviationPlane[i]);
            (Vector256.LoadUnsafe(in weightPlane[i]) + (weight & kept)).StoreUnsafe(ref weightPlane[i]);
            (Vector256.LoadUnsafe(in countPlane[i]) + (Vector256.LoadUnsafe(in counts[i]) & kept)).StoreUnsafe(ref countPlane[i]);
            (Vector256.LoadUnsafe(in squares[i]) + deviation * deviation).StoreUnsafe(ref squares[i]);
        }

        for (; i < row.Length; i++)
        {
            if (row[i] != CellGrid.Missing && weights[i] > 0)
            {
                var deviation = row[i] - means[i];
                deviationPlane[i] += deviation;
                weightPlane[i] += weights[i];
                countPlane[i] += counts[i];
                squares[i] += deviation * deviation;
            }
        }
    }
}
