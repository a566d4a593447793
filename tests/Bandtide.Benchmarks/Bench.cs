using System.Diagnostics;
using System.Globalization;

namespace Bandtide.Benchmarks;

/// <summary>Repeats a piece of work and prints the spread of its times.</summary>
internal static class Bench
{
    /// <summary>Runs the work once unmeasured and then as often as asked; prints minimum, median and maximum in milliseconds.</summary>
    /// <returns>The median, ms.</returns>
    public static async Task<double> MedianAsync(string name, int times, Func<Task> work)
    {
        await work();
        var milliseconds = new double[times];
        for (var i = 0; i < times; i++)
        {
            var started = Stopwatch.GetTimestamp();
            await work();
            milliseconds[i] = Stopwatch.GetElapsedTime(started).TotalMilliseconds;
        }

        Array.Sort(milliseconds);
        var median = milliseconds[times / 2];
        Say($"| {name} | {median:0.000} ms | {milliseconds[0]:0.000} to {milliseconds[^1]:0.000} ms, {times} runs |");
        return median;
    }

    /// <summary>Prints a line with numbers in the invariant culture.</summary>
    public static void Say(FormattableString line) => Console.WriteLine(line.ToString(CultureInfo.InvariantCulture));
}
