using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>The time a heatmap covers.</summary>
public abstract record Period
{
    private Period()
    {
    }

    /// <summary>Whole months, both ends included; a single month has equal ends.</summary>
    public sealed record Months(YearMonth From, YearMonth To) : Period;

    /// <summary>One season over years, both ends included; <c>null</c> means all years.</summary>
    public sealed record SeasonOf(Season Season, int? FromYear, int? ToYear) : Period;
}
