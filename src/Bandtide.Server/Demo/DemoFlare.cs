namespace Bandtide.Server.Demo;

/// <summary>An invented solar flare.</summary>
/// <param name="Day">Days since 1970-01-01.</param>
/// <param name="BeginHour">Hour of the day, with its fraction.</param>
/// <param name="DurationHours">How long the lower ionosphere is lit up.</param>
/// <param name="PeakFlux">X-ray flux 0.1 to 0.8 nm, W/m2: 1e-5 is class M1, 1e-4 class X1.</param>
internal sealed record DemoFlare(int Day, double BeginHour, double DurationHours, double PeakFlux)
{
    /// <summary>Share of an hour, counted from 1970, that the flare covers.</summary>
    public float ShareOf(int hour)
    {
        var begin = Day * 24 + BeginHour;
        return (float)Math.Max(0, Math.Min(hour + 1, begin + DurationHours) - Math.Max(hour, begin));
    }
}
