namespace Bandtide.Core.Heatmaps;

/// <summary>What all stations together say about one date, of each cell.</summary>
/// <param name="size">Number of cells.</param>
internal sealed class DatePlanes(int size)
{
    /// <summary>Sum over the stations of the deviation from the station's mean in the month, in stored units.</summary>
    public float[] Deviations { get; } = new float[size];

    /// <summary>Number of stations whose deviation tells something, beside those of <see cref="FullCount"/>.</summary>
    public float[] Counts { get; } = new float[size];

    /// <summary>Sum over the stations of 1/(days of the station): how much of the mean rests on the date, beside <see cref="FullWeight"/>.</summary>
    public float[] Weights { get; } = new float[size];

    /// <summary>Number of stations that have a value in every cell on all their days, and deviations that tell something.</summary>
    public int FullCount { get; set; }

    /// <summary>Their share of the weight of every cell.</summary>
    public float FullWeight { get; set; }
}
