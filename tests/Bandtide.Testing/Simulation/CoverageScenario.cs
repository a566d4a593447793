using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;

namespace Bandtide.Testing.Simulation;

/// <summary>
/// Stations and days of known true mean, put through the pool as day sheets: each cell of a sheet is a replicate of its own.
/// Value = mean + station + day (first-order autoregression, common to all stations) + rest.
/// </summary>
/// <param name="Name">What it stands for.</param>
/// <param name="Stations">Number of stations; 1 asks for that station, whose own effect is then no error.</param>
/// <param name="Days">Days of the month, at most 31.</param>
public sealed record CoverageScenario(string Name, int Stations, int Days)
{
    private const int SweepsPerHour = 720;
    private const int Looks = 30;

    /// <summary>Scale of the effects. Default occupancy.</summary>
    public CoverageScale Scale { get; init; } = CoverageScale.Occupancy;

    /// <summary>Centre on that scale. Default 0.5.</summary>
    public double Centre { get; init; } = 0.5;

    /// <summary>Standard deviation between stations. Default 0.08.</summary>
    public double StationSd { get; init; } = 0.08;

    /// <summary>Standard deviation of the days' common effect. Default 0.10.</summary>
    public double DaySd { get; init; } = 0.10;

    /// <summary>Lag-1 correlation of the days' common effect. Default 0.4.</summary>
    public double DayCorrelation { get; init; } = 0.4;

    /// <summary>Standard deviation of each station-day's own rest. Default 0.05.</summary>
    public double RestSd { get; init; } = 0.05;

    /// <summary>Share of station-days that are missing. Default 0.</summary>
    public double Missing { get; init; }

    private Measure Measure => Scale == CoverageScale.Level ? Measure.Level : Measure.Occupancy;

    private double StationSdInTruth => Stations == 1 ? 0 : StationSd;

    /// <summary>Simulates until at least so many replicates are there; the same seed gives the same result.</summary>
    public CoverageResult Run(int seed, int replicates)
    {
        var truth = TrueMean();
        var (count, held, below, width) = (0, 0, 0, 0.0);
        for (var round = 0; count < replicates; round++)
        {
            foreach (var cell in Simulate(new Random(unchecked((seed * 1_000_003) + round))).Cells)
            {
                count++;
                held += cell.Lower <= truth && truth <= cell.Upper ? 1 : 0;
                below += cell.Upper < truth ? 1 : 0;
                width += cell.Upper - cell.Lower;
            }
        }

        return new(count, held, below, width / count, truth);
    }

    /// <summary>One heatmap of simulated stations, with intervals.</summary>
    public Heatmap Simulate(Random random)
    {
        var month = new YearMonth(2026, 1);
        var query = new HeatmapQuery(Stations == 1 ? "station-0" : null, Stations == 1 ? null : "all", new Period.Months(month, month)) { Measure = Measure };
        var pool = new DayPool(query, BandPlan.Standard);
        foreach (var (station, sheets) in Sheets(random, month.FirstDay))
        {
            pool.Add(station, sheets);
        }

        return pool.ToHeatmap();
    }

    /// <summary>The simulated stations with their sheets.</summary>
    public IEnumerable<(Station Station, List<DaySheet> Sheets)> Sheets(Random random, DateOnly first)
    {
        short[] ids = [.. BandPlan.Standard.Layer(BandLayer.Service).Select(band => band.Id).Order()];
        var size = CellGrid.Hours * ids.Length;
        var days = CommonDays(random, size);
        for (var s = 0; s < Stations; s++)
        {
            var own = Normals(random, size, StationSdInTruth);
            var values = new int[Days][];
            for (var day = 0; day < Days; day++)
            {
                values[day] = new int[size];
                for (var cell = 0; cell < size; cell++)
                {
                    values[day][cell] = random.NextDouble() < Missing ? CellGrid.Missing : Value(random, own[cell] + days[day][cell]);
                }
            }

            var station = new Station(s, $"station-{s}", "Simulated", new GeoPoint(s % 80, s % 170), LevelUnit.DbMilliwatt, 1, []);
            yield return (station, [.. values.Select((plane, day) => new DaySheet(first.AddDays(day), Grid(ids, plane)))]);
        }
    }

    private CellGrid Grid(short[] ids, int[] values)
    {
        var planes = new int[]?[CellGrid.QuantityCount];
        planes[(int)Quantity.Sweeps] = [.. values.Select(value => value == CellGrid.Missing ? CellGrid.Missing : SweepsPerHour)];
        planes[(int)Quantity.Occupancy] = Measure == Measure.Occupancy ? values : planes[(int)Quantity.Sweeps];
        planes[(int)Quantity.Level] = Measure == Measure.Level ? values : null;
        return new(ids, planes);
    }

    private double[][] CommonDays(Random random, int size)
    {
        var days = new double[Days][];
        for (var day = 0; day < Days; day++)
        {
            days[day] = Normals(random, size, day == 0 ? DaySd : DaySd * Math.Sqrt(1 - (DayCorrelation * DayCorrelation)));
            for (var cell = 0; day > 0 && cell < size; cell++)
            {
                days[day][cell] += DayCorrelation * days[day - 1][cell];
            }
        }

        return days;
    }

    private int Value(Random random, double effects)
    {
        var value = Centre + effects + (RestSd * Normal(random));
        return Scale switch
        {
            CoverageScale.Level => (int)Math.Round(100 * 100 * (value - Centre)) - 9000,
            CoverageScale.Occupancy => Share(value),
            CoverageScale.LogitOccupancy => Share(Expit(value)),
            CoverageScale.BetaOccupancy => Share(Beta(random)),
            _ => Share((double)Enumerable.Range(0, Looks).Count(_ => random.NextDouble() < Expit(value)) / Looks),
        };
    }

    private static int Share(double value) => (int)Math.Round(10_000 * Math.Clamp(value, 0, 1));

    // On the logit scale the mean over all effects, by a fine sum over the normal distribution.
    private double TrueMean()
    {
        switch (Scale)
        {
            case CoverageScale.Level:
                return -90;
            case CoverageScale.Occupancy:
                return Centre;
            case CoverageScale.BetaOccupancy:
                return 0.5 / 20.5;
        }

        var spread = Math.Sqrt((StationSdInTruth * StationSdInTruth) + (DaySd * DaySd) + (RestSd * RestSd));
        var (sum, weights) = (0.0, 0.0);
        for (var z = -8.0; z <= 8; z += 0.004)
        {
            var weight = Math.Exp(-z * z / 2);
            sum += weight * Expit(Centre + (spread * z));
            weights += weight;
        }

        return sum / weights;
    }

    // Beta(1/2, 20) as the ratio of gamma variates: half a squared normal, and twenty exponentials.
    private static double Beta(Random random)
    {
        var half = Math.Pow(Normal(random), 2) / 2;
        var twenty = 0.0;
        for (var i = 0; i < 20; i++)
        {
            twenty -= Math.Log(1 - random.NextDouble());
        }

        return half / (half + twenty);
    }

    private static double Expit(double x) => 1 / (1 + Math.Exp(-x));

    private static double[] Normals(Random random, int count, double sd)
    {
        var values = new double[count];
        for (var i = 0; i < count; i++)
        {
            values[i] = sd * Normal(random);
        }

        return values;
    }

    // Box and Muller (1958).
    private static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
