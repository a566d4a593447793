using Bandtide.Core.Stations;

namespace Bandtide.Core.Heatmaps;

/// <summary>Collects one mean per station and cell and gives each voter, station or square, one vote.</summary>
internal sealed class Votes(int cells, VoteUnit unit)
{
    private readonly double[] mean = new double[cells];
    private readonly double[] squares = new double[cells];
    private readonly int[] voters = new int[cells];
    private readonly Dictionary<string, (double[] Sum, int[] Count)> bySquare = new(StringComparer.Ordinal);
    private bool counted;

    /// <summary>Mean over the voters, per cell.</summary>
    public double Mean(int cell) => voters[cell] == 0 ? double.NaN : mean[cell];

    /// <summary>Number of voters, per cell.</summary>
    public int Count(int cell) => voters[cell];

    /// <summary>Sample variance (divisor n-1) between voters; NaN under two.</summary>
    public double Variance(int cell) => voters[cell] < 2 ? double.NaN : squares[cell] / (voters[cell] - 1);

    /// <summary>Adds a station's means; NaN where it has none.</summary>
    public void Add(Station station, ReadOnlySpan<double> means)
    {
        if (unit == VoteUnit.Station)
        {
            for (var c = 0; c < means.Length; c++)
            {
                Vote(c, means[c]);
            }

            return;
        }

        var key = station.Square.ToString();
        if (!bySquare.TryGetValue(key, out var square))
        {
            bySquare.Add(key, square = (new double[cells], new int[cells]));
        }

        for (var c = 0; c < means.Length; c++)
        {
            if (!double.IsNaN(means[c]))
            {
                square.Sum[c] += means[c];
                square.Count[c]++;
            }
        }
    }

    /// <summary>Lets the squares vote; call once, after the last station.</summary>
    public void Close()
    {
        if (counted)
        {
            return;
        }

        counted = true;
        foreach (var (sum, count) in bySquare.Values)
        {
            for (var c = 0; c < cells; c++)
            {
                Vote(c, count[c] == 0 ? double.NaN : sum[c] / count[c]);
            }
        }
    }

    // Welford (1962): no difference of large sums.
    private void Vote(int c, double value)
    {
        if (double.IsNaN(value))
        {
            return;
        }

        var away = value - mean[c];
        mean[c] += away / ++voters[c];
        squares[c] += away * (value - mean[c]);
    }
}
