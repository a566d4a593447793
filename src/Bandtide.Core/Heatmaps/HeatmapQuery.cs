using Bandtide.Core.Bands;

namespace Bandtide.Core.Heatmaps;

/// <summary>One heatmap, completely described: what the API's query string and a page's address say.</summary>
/// <param name="Station">Code of a station, or <c>null</c> when a region is asked for.</param>
/// <param name="Region">Code of a region, or <c>null</c> when a station is asked for.</param>
/// <param name="Period">The time covered.</param>
public sealed record HeatmapQuery(string? Station, string? Region, Period Period)
{
    /// <summary>What is shown. Default occupancy.</summary>
    public Measure Measure { get; init; } = Measure.Occupancy;

    /// <summary>How it is pooled. Default mean.</summary>
    public Statistic Statistic { get; init; } = Statistic.Mean;

    /// <summary>Clock of the columns. Default UTC.</summary>
    public HourClock Clock { get; init; } = HourClock.Utc;

    /// <summary>Layer of the rows. Default service.</summary>
    public BandLayer Layer { get; init; } = BandLayer.Service;

    /// <summary>Whether an interval is wanted. Default auto.</summary>
    public IntervalChoice Interval { get; init; } = IntervalChoice.Auto;

    /// <summary>Whose seasons. Default local.</summary>
    public SeasonAlignment Alignment { get; init; } = SeasonAlignment.Local;

    /// <summary>Who votes. Default each station.</summary>
    public VoteUnit Vote { get; init; } = VoteUnit.Station;

    /// <summary>Stations with fewer days in a cell are left out of it. Default 1.</summary>
    public int MinDays { get; init; } = 1;

    /// <summary>Cells with fewer sweeps are left out. Default 1.</summary>
    public int MinSweeps { get; init; } = 1;

    /// <summary>Whether the answer needs day sheets, not month tiles alone.</summary>
    public bool NeedsSheets => MinSweeps > 1
        || Statistic is Statistic.Median or Statistic.P10 or Statistic.P90
        || (Statistic == Statistic.Sd && Station is not null)
        || (Statistic == Statistic.Mean && Interval == IntervalChoice.Auto);
}
