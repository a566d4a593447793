using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using CsCheck;

namespace Bandtide.Core.Tests.Heatmaps;

/// <summary>A few stations with a few weeks of sheets of chance, full of gaps, ties and uneven numbers of days.</summary>
internal sealed class RandomNetwork
{
    private static readonly DateOnly First = new(2025, 11, 24);

    private RandomNetwork(List<(Station Station, List<DaySheet> Days)> stations) => Stations = stations;

    /// <summary>Networks of 1 to 5 stations.</summary>
    public static Gen<RandomNetwork> Any { get; } = Gen.Int.Select(Make);

    public List<(Station Station, List<DaySheet> Days)> Stations { get; }

    public override string ToString() => string.Join("; ", Stations.Select(station => $"{station.Station.Code}: {station.Days.Count} days"));

    private static RandomNetwork Make(int seed)
    {
        var random = new Random(seed);
        var stations = new List<(Station, List<DaySheet>)>();
        for (var s = random.Next(1, 6); s > 0; s--)
        {
            // Few places, so that stations share squares.
            var point = new GeoPoint(40 + random.Next(2), -170 + 340 * random.Next(2) + random.NextDouble());
            var station = new Station(s, $"station-{s}", "A station", point, LevelUnit.DbMilliwatt, 1, []);
            var presence = 0.7 * random.NextDouble();
            var dates = Enumerable.Range(0, 44).Where(_ => random.NextDouble() < presence).Select(First.AddDays);
            stations.Add((station, [.. dates.Select(date => new DaySheet(date, Grid(random)))]));
        }

        return new(stations);
    }

    private static CellGrid Grid(Random random)
    {
        // Both layers, at times every band of one, at times a few.
        var chance = random.Next(8) == 0 ? 1 : 0.08;
        short[] ids = [.. BandPlan.Standard.All.Select(band => band.Id).Where(_ => random.NextDouble() < chance).Append((short)3).Distinct().Order()];
        var size = CellGrid.Hours * ids.Length;
        var sweeps = new int[size];
        var exists = random.NextDouble();
        for (var i = 0; i < size; i++)
        {
            sweeps[i] = random.NextDouble() < exists ? random.Next(1, 6) * 60 : CellGrid.Missing;
        }

        int[]? Plane(int low, int high, double chanceOfValue)
        {
            var plane = sweeps.Select(count => count != CellGrid.Missing && random.NextDouble() < chanceOfValue ? random.Next(low, high + 1) : CellGrid.Missing).ToArray();
            return chanceOfValue < 1 && random.Next(5) == 0 ? null : plane;
        }

        // A few coarse steps only, so that many values are equal.
        return new(
            ids,
            [
                sweeps, Plane(0, 12, 1), Plane(-8000, -7990, 0.6), Plane(-9000, -8000, 0.9), Plane(-7500, -7000, 0.9), Plane(-10_000, -9990, 0.7),
                Plane(0, 3, 0.5), null,
            ]);
    }
}
