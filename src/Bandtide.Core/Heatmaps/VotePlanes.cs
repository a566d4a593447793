namespace Bandtide.Core.Heatmaps;

/// <summary>Per cell of a pool: the sum of station means, the number of stations and their days.</summary>
/// <param name="size">Number of cells.</param>
internal sealed class VotePlanes(int size)
{
    /// <summary>Sum of the stations' means, in stored steps.</summary>
    public double[] Sums { get; } = new double[size];

    /// <summary>Stations that reported.</summary>
    public int[] Stations { get; } = new int[size];

    /// <summary>Station-days that reported.</summary>
    public int[] Days { get; } = new int[size];

    /// <summary>Adds the stations and days of other planes, not their means.</summary>
    public void AddCounts(VotePlanes other)
    {
        for (var i = 0; i < Stations.Length; i++)
        {
            Stations[i] += other.Stations[i];
            Days[i] += other.Days[i];
        }
    }
}
