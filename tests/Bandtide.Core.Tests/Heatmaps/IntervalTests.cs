using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Statistics;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Heatmaps;

/// <summary>Intervals in the cases where formulas tend to break.</summary>
public sealed class IntervalTests
{
    private static readonly DateOnly First = new(2026, 6, 1);
    private static readonly HeatmapQuery Region = new(null, "all", new Period.Months(new(2026, 6), new(2026, 6)));

    [Fact]
    public void The_mean_lies_in_its_interval_and_shares_within_their_bounds() => Gen.Select(Gen.Enum<Measure>(), Gen.Enum<VoteUnit>(), RandomNetwork.Any).Sample(
        (measure, vote, network) =>
        {
            foreach (var cell in PoolTests.FromDays(Region with { Measure = measure, Vote = vote }, network).Cells)
            {
                if (double.IsNaN(cell.Lower))
                {
                    // Unknown as a whole, and only where no station has two days in a month.
                    Assert.True(double.IsNaN(cell.Upper) && cell.Days <= 3 * cell.Stations);
                    continue;
                }

                Assert.InRange(cell.Value, cell.Lower - 1e-9, cell.Upper + 1e-9);
                if (measure.Info().IsShare)
                {
                    Assert.InRange(cell.Lower, 0, 1);
                    Assert.InRange(cell.Upper, 0, 1);
                    Assert.True(cell.Upper > cell.Lower);
                }
            }
        },
        iter: 100);

    [Theory]
    [InlineData(0)]
    [InlineData(10_000)]
    public void Days_at_the_end_of_the_scale_have_an_interval_inside_it(int occupancy)
    {
        var cell = Cell(Region, [.. Enumerable.Repeat(occupancy, 30)]);
        var (inner, end) = occupancy == 0 ? (cell.Upper, cell.Lower) : (1 - cell.Lower, 1 - cell.Upper);
        Assert.Equal(0, end, 1e-12);

        // Nothing in 30 x 60 looks: the rule of three (Hanley and Lippman-Hand 1983, JAMA 249, 1743) gives 3/1800; the logit is safer.
        Assert.InRange(inner, 3 / 1800.0, 5 * 3 / 1800.0);
    }

    [Fact]
    public void One_day_tells_nothing_about_other_days()
    {
        Assert.True(double.IsNaN(Cell(Region, [4_000]).Lower));
        Assert.True(double.IsNaN(Cell(Region, [4_000], [4_500], [5_000]).Upper));
    }

    [Fact]
    public void Two_days_tell_a_little()
    {
        var cell = Cell(Region, [4_000, 4_100]);
        Assert.True(cell.Lower < 0.33 && cell.Upper > 0.49);
    }

    [Fact]
    public void Two_stations_have_an_interval_too()
    {
        var random = new Random(1);
        var cell = Cell(Region, Days(random, 3_000), Days(random, 5_000));
        Assert.InRange(cell.Lower, 0, 0.3);
        Assert.InRange(cell.Upper, 0.5, 1);
    }

    [Fact]
    public void Equal_levels_every_day_have_no_width()
    {
        var cell = Cell(Region with { Measure = Measure.Level }, [.. Enumerable.Repeat(-9_000, 20)], [.. Enumerable.Repeat(-9_000, 20)]);
        Assert.Equal((-90, -90, -90), (cell.Value, cell.Lower, cell.Upper));
    }

    [Fact]
    public void Without_interval_or_with_another_statistic_there_is_none() => Assert.All(
        [Region with { Interval = IntervalChoice.None }, .. Enum.GetValues<Statistic>().Where(statistic => statistic != Statistic.Mean).Select(statistic => Region with { Statistic = statistic })],
        query => Assert.True(double.IsNaN(Cell(query, Days(new(1), 5_000), Days(new(2), 5_000)).Lower)));

    // The course of the year is what a range of months shows, not an uncertainty of its mean.
    [Fact]
    public void The_change_from_month_to_month_is_no_uncertainty()
    {
        var random = new Random(3);
        int[] june = Days(random, 5_000), july = Days(random, 5_000, 31);
        var flat = Cell(Region, [.. june, .. july]);
        var rising = Cell(Region, [.. june, .. july.Select(value => value + 2_000)]);
        Assert.Equal(flat.Upper - flat.Lower, rising.Upper - rising.Lower, 0.05 * (flat.Upper - flat.Lower));
    }

    // A station that lacks one cell goes the way of stations with gaps; its other cells must not notice.
    [Fact]
    public void Stations_with_and_without_gaps_give_the_same_interval_where_both_are_whole()
    {
        var stations = Enumerable.Range(0, 4).Select(n => Days(new(n), 5_000)).ToArray();
        var whole = Heatmap(Region, stations, gap: false);
        var gap = Heatmap(Region, stations, gap: true);
        Assert.Equal(whole[0, 5].Lower, gap[0, 5].Lower, 1e-6);
        Assert.Equal(whole[0, 5].Upper, gap[0, 5].Upper, 1e-6);
        Assert.NotEqual(whole[0, 7].Days, gap[0, 7].Days);
    }

    [Fact]
    public void Squares_that_hold_one_station_each_vote_like_stations()
    {
        var stations = Enumerable.Range(0, 4).Select(n => Days(new(n), 4_000 + 500 * n)).ToArray();
        var (byStation, bySquare) = (Cell(Region, stations), Cell(Region with { Vote = VoteUnit.Square }, stations));
        Assert.Equal((byStation.Lower, byStation.Upper), (bySquare.Lower, bySquare.Upper));
    }

    // Independent of the components: resample stations and, for all of them together, blocks of days (Kuensch 1989, Annals of
    // Statistics 17, 1217-1241), and look at the spread of the mean. One station and one block fewer are drawn than there are, for
    // else the spread is too small by (n - 1)/n (Rao and Wu 1988, Journal of the American Statistical Association 83, 231-241).
    // Blocks of six days cut the correlation, which by the arithmetic of an AR(1) series of 0.4 leaves 0.87 of the variance here; the
    // components lie above it, for the variance rises faster than the correlation, of which a month tells little.
    [Fact]
    public void The_variance_agrees_with_a_joint_bootstrap_of_stations_and_blocks_of_days()
    {
        const int networks = 8, stations = 20, days = 30, cells = 24;
        var random = new Random(20260601);
        var (estimated, resampled) = (0.0, 0.0);
        for (var network = 0; network < networks; network++)
        {
            var values = new double[cells][,];
            var sheets = Simulate(random, stations, days, values);
            var pool = new IntervalPoolProbe(Region with { Measure = Measure.Level });
            sheets.ForEach(station => pool.Add(station.Station, station.Days));
            pool.Close();
            estimated += Enumerable.Range(0, cells).Average(cell => pool.Variance(cell)) / networks;
            resampled += Enumerable.Range(0, cells).Average(cell => Bootstrap(random, values[cell], 300, blockDays: 6)) / networks;
        }

        // Stations 0.8 squared over 20, days (1 + 2 sum of (1 - k/30) 0.4^k) over 30, rest 0.25 over 600; in squared stored units.
        const double truth = 10_000 * (0.0320 + 0.0740 + 0.0004);
        Assert.InRange(resampled / truth, 0.77, 0.97);
        Assert.InRange(estimated / truth, 0.95, 1.3);
    }

    private static double Bootstrap(Random random, double[,] values, int times, int blockDays)
    {
        var (stations, days) = (values.GetLength(0), values.GetLength(1));
        var means = new double[times];
        for (var i = 0; i < times; i++)
        {
            var drawn = Enumerable.Range(1, stations - 1).Select(_ => random.Next(stations)).ToArray();
            var taken = Enumerable.Range(1, days / blockDays - 1).SelectMany(_ => Enumerable.Range(random.Next(days - blockDays + 1), blockDays)).ToArray();
            means[i] = drawn.Average(station => taken.Average(day => values[station, day]));
        }

        var mean = means.Average();
        return means.Sum(value => (value - mean) * (value - mean)) / (times - 1);
    }

    private static List<(Station Station, List<DaySheet> Days)> Simulate(Random random, int stations, int days, double[][,] values)
    {
        for (var cell = 0; cell < values.Length; cell++)
        {
            values[cell] = new double[stations, days];
            var (day, common) = (0.0, Enumerable.Range(0, days).Select(_ => 0.0).ToArray());
            for (var d = 0; d < days; d++)
            {
                day = d == 0 ? Gauss(random) : 0.4 * day + Math.Sqrt(1 - 0.16) * Gauss(random);
                common[d] = day;
            }

            for (var s = 0; s < stations; s++)
            {
                var own = 0.8 * Gauss(random);
                for (var d = 0; d < days; d++)
                {
                    values[cell][s, d] = Math.Round(-9_000 + 100 * (own + common[d] + 0.5 * Gauss(random)));
                }
            }
        }

        return [.. Enumerable.Range(0, stations).Select(s => (NewStation(s), Enumerable.Range(0, days).Select(d =>
            new DaySheet(First.AddDays(d), Grid(hour => (int)values[hour][s, d]))).ToList()))];
    }

    private static int[] Days(Random random, int centre, int count = 30) =>
        [.. Enumerable.Range(0, count).Select(_ => centre + (int)(800 * Gauss(random)))];

    private static double Gauss(Random random) => Normal.Quantile(1 - random.NextDouble() * (1 - 1e-12));

    private static HeatmapCell Cell(HeatmapQuery query, params int[][] stations) => Heatmap(query, stations, gap: false)[0, 5];

    private static Heatmap Heatmap(HeatmapQuery query, int[][] stations, bool gap)
    {
        var pool = new DayPool(query, BandPlan.Standard);
        for (var s = 0; s < stations.Length; s++)
        {
            var days = stations[s].Select((value, d) => new DaySheet(First.AddDays(d), Grid(hour => gap && hour == 7 && d == 3 ? CellGrid.Missing : value)));
            pool.Add(NewStation(s), days);
        }

        return pool.ToHeatmap();
    }

    private static Station NewStation(int number) => new(number, $"station-{number}", "A station", new GeoPoint(number, 5 * number), LevelUnit.DbMilliwatt, 1, []);

    // One band, the same value as occupancy and as level.
    private static CellGrid Grid(Func<int, int> value)
    {
        var plane = Enumerable.Range(0, 24).Select(value).ToArray();
        int[] sweeps = [.. plane.Select(item => item == CellGrid.Missing ? CellGrid.Missing : 720)];
        return new([6], [sweeps, plane, null, plane, null, null, null, null]);
    }
}
