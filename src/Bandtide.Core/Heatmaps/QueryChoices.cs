namespace Bandtide.Core.Heatmaps;

/// <summary>How the days and stations of a cell become one value.</summary>
public enum Statistic
{
    /// <summary>Mean over stations of each station's mean over its days.</summary>
    Mean,

    /// <summary>Median over station-days, each with weight 1/(days of its station).</summary>
    Median,

    /// <summary>Tenth percentile, weighted likewise.</summary>
    P10,

    /// <summary>Ninetieth percentile, weighted likewise.</summary>
    P90,

    /// <summary>Standard deviation: between station means for a region, between days for a station.</summary>
    Sd,
}

/// <summary>The clock whose hours are the columns.</summary>
public enum HourClock
{
    /// <summary>Coordinated universal time.</summary>
    Utc,

    /// <summary>Local apparent solar time of each station, in whole hours.</summary>
    Solar,
}

/// <summary>Whose seasons a region follows.</summary>
public enum SeasonAlignment
{
    /// <summary>Each station its own hemisphere's.</summary>
    Local,

    /// <summary>All as in the north.</summary>
    Calendar,
}

/// <summary>Who has one vote in a region's mean.</summary>
public enum VoteUnit
{
    /// <summary>Each station.</summary>
    Station,

    /// <summary>Each Maidenhead square, so that co-located stations do not count double.</summary>
    Square,
}

/// <summary>Whether a 95 % interval of the mean is wanted.</summary>
public enum IntervalChoice
{
    /// <summary>Where the statistic is a mean.</summary>
    Auto,

    /// <summary>Never; the answer comes from month tiles alone.</summary>
    None,
}
