namespace Bandtide.Server.Demo;

/// <summary>When a station observed: its failures, broken days and power cuts.</summary>
internal sealed class DemoTimes(DemoStation station)
{
    private const int LongestFailure = 9;
    private readonly ulong failurePurpose = DemoRandom.Purpose(station.Code + "/failure");
    private readonly ulong hourPurpose = DemoRandom.Purpose(station.Code + "/hours");

    /// <summary>Hours that were observed, bit h for hour h; 0 for a day without a sheet.</summary>
    public int HoursOn(DateOnly date)
    {
        var day = DemoWeather.DayOf(date);
        if (date < station.FirstDate || date > station.LastDate || HasFailed(day))
        {
            return 0;
        }

        const int All = (1 << 24) - 1;
        var random = DemoRandom.Of(hourPurpose, day);
        var mask = All;
        if (random.Share() < station.Faults.BrokenDayShare)
        {
            var first = (int)(24 * random.Share());
            mask &= ~Run(first, Math.Min(23, first + (int)(9 * random.Share())));
        }

        if (station.Faults.PowerCuts is { } cuts && random.Share() < cuts.Share)
        {
            mask &= ~Run(cuts.First, cuts.Last);
        }

        return mask;
    }

    private static int Run(int first, int last) => ((1 << (last + 1)) - 1) & ~((1 << first) - 1);

    private bool HasFailed(int day)
    {
        for (var back = 0; back < LongestFailure; back++)
        {
            var random = DemoRandom.Of(failurePurpose, day - back);
            if (random.Share() < station.Faults.FailuresPerYear / 365 && 1 + (int)(LongestFailure * Math.Pow(random.Share(), 2)) > back)
            {
                return true;
            }
        }

        return false;
    }
}
