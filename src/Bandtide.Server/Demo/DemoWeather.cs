using Bandtide.Core.Sun;

namespace Bandtide.Server.Demo;

/// <summary>What the Sun does to every station alike, day by day and hour by hour: declination, activity, storms, flares.</summary>
/// <remarks>All but the declination is invented. Each day's chance depends on its date alone, not on the range asked for.</remarks>
internal sealed class DemoWeather
{
    // A storm or an anomaly reaches at most so many days on.
    private const int Memory = 3;
    private static readonly int EpochDayNumber = DateOnly.FromDateTime(DateTime.UnixEpoch).DayNumber;
    private static readonly ulong StormPurpose = DemoRandom.Purpose("storm");
    private static readonly ulong FlarePurpose = DemoRandom.Purpose("flare");
    private static readonly ulong LayerPurpose = DemoRandom.Purpose("layer");
    private static readonly ulong TrafficPurpose = DemoRandom.Purpose("traffic");

    private readonly int firstDay;
    private readonly DemoDay[] days;
    private readonly float[] stormLoss;
    private readonly float[] flareTerm;

    /// <summary>Draws up a range of days; both are included.</summary>
    public DemoWeather(DateOnly first, DateOnly last)
    {
        firstDay = DayOf(first);
        var count = DayOf(last) - firstDay + 1;
        days = [.. Enumerable.Range(firstDay, count).Select(Day)];
        Storms = [.. Enumerable.Range(firstDay - Memory, count + Memory).Select(StormOf).OfType<DemoStorm>()];
        Flares = [.. Enumerable.Range(firstDay - 1, count + 1).Select(FlareOf).OfType<DemoFlare>()];
        stormLoss = new float[count * 24];
        flareTerm = new float[count * 24];
        var firstHour = firstDay * 24;
        foreach (var storm in Storms)
        {
            for (var hour = Math.Max(storm.FirstHour, firstHour); hour < Math.Min(storm.FirstHour + storm.Hours, firstHour + stormLoss.Length); hour++)
            {
                stormLoss[hour - firstHour] = Math.Max(storm.LossAt(hour), stormLoss[hour - firstHour]);
            }
        }

        foreach (var flare in Flares)
        {
            for (var hour = Math.Max(flare.Day * 24, firstHour); hour < Math.Min((flare.Day + 2) * 24, firstHour + flareTerm.Length); hour++)
            {
                flareTerm[hour - firstHour] += flare.ShareOf(hour) * DemoAbsorption.FlareTerm(flare.PeakFlux);
            }
        }
    }

    /// <summary>The storms that touch the range.</summary>
    public IReadOnlyList<DemoStorm> Storms { get; }

    /// <summary>The flares that touch the range.</summary>
    public IReadOnlyList<DemoFlare> Flares { get; }

    /// <summary>Days since 1970-01-01.</summary>
    public static int DayOf(DateOnly date) => date.DayNumber - EpochDayNumber;

    /// <summary>What holds for a whole day.</summary>
    public DemoDay On(int day) => days[day - firstDay];

    /// <summary>Share of critical frequency that high latitudes lose in an hour, counted from 1970.</summary>
    public float StormLossAt(int hour) => At(stormLoss, hour);

    /// <summary>Flare absorption of an hour, see <see cref="DemoAbsorption.FlareTerm"/>, weighted with the flare's share of the hour.</summary>
    public float FlareTermAt(int hour) => At(flareTerm, hour);

    /// <summary>An invented course of a solar cycle, in the manner of a smoothed sunspot number: a broad rise and fall.</summary>
    public static float ActivityOn(int day)
    {
        // Greatest in the second half of 2024, with a swing as the Sun turns in 27 days.
        const double Peak = 19_980;
        const double Width = 950;
        var course = 25 + 125 * Math.Exp(-0.5 * Math.Pow((day - Peak) / Width, 2));
        return (float)(course * (1 + 0.12 * Math.Sin(2 * Math.PI * day / 27)));
    }

    private float At(float[] values, int hour)
    {
        var i = hour - firstDay * 24;
        return (uint)i < (uint)values.Length ? values[i] : 0;
    }

    private static DemoDay Day(int day)
    {
        var noon = DateTimeOffset.UnixEpoch.AddDays(day).AddHours(12);
        var subsolar = SolarPosition.Subsolar(noon);
        return new(
            ActivityOn(day),
            (float)subsolar.LatitudeDegrees,
            (float)subsolar.LongitudeDegrees,
            DemoRandom.Anomaly(LayerPurpose, day),
            DemoRandom.Anomaly(TrafficPurpose, day),
            noon.DayOfWeek is DayOfWeek.Saturday or DayOfWeek.Sunday,
            DemoSchedules.IsSummerSeason(DateOnly.FromDateTime(noon.UtcDateTime)));
    }

    private static DemoStorm? StormOf(int day)
    {
        var random = DemoRandom.Of(StormPurpose, day);
        if (random.Share() >= 0.025 + 0.0002 * ActivityOn(day))
        {
            return null;
        }

        var severity = random.Share();
        return new(
            day * 24 + (int)(random.Share() * 24), 24 + (int)(36 * random.Share()), (float)(0.15 + 0.35 * severity), random.Share() < 0.4);
    }

    private static DemoFlare? FlareOf(int day)
    {
        var random = DemoRandom.Of(FlarePurpose, day);
        if (random.Share() >= 0.0012 * ActivityOn(day))
        {
            return null;
        }

        // From class M1 up to X3, the strong ones rare.
        var strength = Math.Pow(random.Share(), 2);
        return new(day, random.Share() * 24, 0.6 + 0.9 * strength + 0.3 * random.Share(), 1e-5 * Math.Pow(30, strength));
    }
}
