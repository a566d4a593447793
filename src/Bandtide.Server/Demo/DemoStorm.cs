namespace Bandtide.Server.Demo;

/// <summary>An invented geomagnetic storm: the F layer weakened for a day or two, most of all at high latitudes.</summary>
/// <param name="FirstHour">Hours since 1970-01-01T00Z.</param>
/// <param name="Hours">How long it lasts.</param>
/// <param name="Depth">Greatest loss of critical frequency at high latitude, as a share.</param>
/// <param name="RisesFirst">Whether the layer is strengthened for its first hours.</param>
internal sealed record DemoStorm(int FirstHour, int Hours, float Depth, bool RisesFirst)
{
    private const int RiseHours = 4;
    private const int RampHours = 6;

    /// <summary>Loss of critical frequency at high latitude in an hour, as a share; negative while it rises.</summary>
    public float LossAt(int hour)
    {
        var since = hour - FirstHour;
        if (since < 0 || since >= Hours)
        {
            return 0;
        }

        if (RisesFirst && since < RiseHours)
        {
            return -0.25f * Depth;
        }

        var ramp = Math.Min(1f, (since + 1f) / RampHours);
        var recovery = Math.Min(1f, (Hours - since) / (0.5f * Hours));
        return Depth * ramp * recovery;
    }
}
