namespace Bandtide.Core.Heatmaps;

/// <summary>The clock whose hours are the columns.</summary>
public enum HourClock
{
    /// <summary>Coordinated universal time.</summary>
    Utc,

    /// <summary>Local apparent solar time of each station, in whole hours.</summary>
    Solar,
}
