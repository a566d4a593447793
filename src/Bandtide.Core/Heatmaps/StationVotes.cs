using Bandtide.Core.Geography;
using Bandtide.Core.Stations;
using Bandtide.Core.Statistics;

namespace Bandtide.Core.Heatmaps;

/// <summary>Turns station means into one value a cell: every station, or every square, has one vote.</summary>
internal sealed class StationVotes
{
    private readonly HeatmapQuery query;
    private readonly int size;
    private readonly VotePlanes all;
    private readonly Dictionary<MaidenheadLocator, VotePlanes> squares = [];
    private Spread? spread;

    /// <param name="query">Its vote, <c>mindays</c> and statistic count here.</param>
    /// <param name="size">Number of cells.</param>
    /// <param name="needsSpread">Whether <see cref="Variance"/> will be asked for.</param>
    public StationVotes(HeatmapQuery query, int size, bool needsSpread)
    {
        (this.query, this.size) = (query, size);
        all = new(size);
        spread = needsSpread && query.Vote == VoteUnit.Station ? new(size) : null;
    }

    /// <summary>Whether a station's means may be added straight to its planes.</summary>
    public bool NeedsStationsOneByOne => spread is not null;

    /// <summary>Where a station's means are summed.</summary>
    public VotePlanes PlanesOf(Station station) =>
        query.Vote == VoteUnit.Station ? all
        : squares.TryGetValue(station.Square, out var planes) ? planes
        : squares[station.Square] = new(size);

    /// <summary>Adds one station: days and sums of each cell.</summary>
    public void Add(Station station, ReadOnlySpan<int> days, ReadOnlySpan<double> sums)
    {
        TileKernel.AddMeans(days, sums, PlanesOf(station), query.MinDays);
        spread?.Add(sums, days, query.MinDays);
    }

    /// <summary>Lets the squares vote. Call once, after the last station and before any value is read.</summary>
    public void Count()
    {
        if (query.Vote == VoteUnit.Station)
        {
            return;
        }

        spread = new(size);
        foreach (var square in squares.Values)
        {
            spread.Add(square.Sums, square.Stations, 1);
            all.AddCounts(square);
        }
    }

    /// <summary>Mean of the votes, or NaN.</summary>
    public double Mean(int cell) =>
        query.Vote == VoteUnit.Square ? spread!.Mean(cell) : all.Stations[cell] > 0 ? all.Sums[cell] / all.Stations[cell] : double.NaN;

    /// <summary>Variance between the votes, divisor n - 1, or NaN under two.</summary>
    public double Variance(int cell) => spread!.Variance(cell);

    /// <summary>Number of votes.</summary>
    public int Voters(int cell) => spread!.Count(cell);

    /// <summary>Stations that reported.</summary>
    public int Stations(int cell) => all.Stations[cell];

    /// <summary>Station-days that reported.</summary>
    public int Days(int cell) => all.Days[cell];
}
