namespace Bandtide.Core.Time;

/// <summary>Meteorological season: three whole calendar months, named as people on the spot name them.</summary>
public enum Season
{
    /// <summary>December to February in the north, June to August in the south.</summary>
    Winter,

    /// <summary>March to May in the north, September to November in the south.</summary>
    Spring,

    /// <summary>June to August in the north, December to February in the south.</summary>
    Summer,

    /// <summary>September to November in the north, March to May in the south.</summary>
    Autumn,
}
