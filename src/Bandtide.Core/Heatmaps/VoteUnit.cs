namespace Bandtide.Core.Heatmaps;

/// <summary>Who has one vote in a region's mean.</summary>
public enum VoteUnit
{
    /// <summary>Each station.</summary>
    Station,

    /// <summary>Each Maidenhead square, so that co-located stations do not count double.</summary>
    Square,
}
