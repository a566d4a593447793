using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Heatmaps;

/// <summary>Pools give what the plain definitions give, whatever the query.</summary>
public sealed class PoolTests
{
    private static readonly Period Months = new Period.Months(new(2025, 11), new(2026, 1));

    private static readonly Gen<HeatmapQuery> Queries =
        from measure in Gen.Enum<Measure>()
        from statistic in Gen.Enum<Statistic>()
        from clock in Gen.Enum<HourClock>()
        from layer in Gen.Enum<BandLayer>()
        from vote in Gen.Enum<VoteUnit>()
        from interval in Gen.Enum<IntervalChoice>()
        from minDays in AnyOf(1, 1, 2, 7)
        from minSweeps in AnyOf(1, 1, 120, 300)
        select new HeatmapQuery(null, "all", Months)
        {
            Measure = measure,
            Statistic = statistic,
            Clock = clock,
            Layer = layer,
            Vote = vote,
            Interval = interval,
            MinDays = minDays,
            MinSweeps = minSweeps,
        };

    [Fact]
    public void Day_pools_equal_the_plain_computation() => Gen.Select(Queries, RandomNetwork.Any).Sample(
        (query, network) => AssertEqual(new(query, network), FromDays(query, network)), iter: 150);

    [Fact]
    public void A_day_pool_of_one_station_equals_the_plain_computation() => Gen.Select(Queries, RandomNetwork.Any).Sample(
        (query, network) =>
        {
            network.Stations.RemoveRange(1, network.Stations.Count - 1);
            var single = query with { Region = null, Station = network.Stations[0].Station.Code };
            AssertEqual(new(single, network), FromDays(single, network));
        },
        iter: 100);

    [Fact]
    public void Tile_pools_equal_the_plain_computation() => Gen.Select(Queries, RandomNetwork.Any).Sample(
        (query, network) =>
        {
            var question = query with { Interval = IntervalChoice.None, MinSweeps = 1 };
            if (!question.NeedsSheets)
            {
                AssertEqual(new(question, network), FromTiles(question, network));
            }
        },
        iter: 300);

    [Fact]
    public void Means_from_tiles_and_from_days_are_the_same_to_the_last_bit() => Gen.Select(Queries, RandomNetwork.Any).Sample(
        (query, network) =>
        {
            var question = query with { Interval = IntervalChoice.None, MinSweeps = 1, Statistic = Statistic.Mean };
            var (tiles, days) = (FromTiles(question, network), FromDays(question, network));
            Assert.Equal(tiles.Bands, days.Bands);
            Assert.Equal(tiles.Cells.ToArray(), days.Cells.ToArray());
        },
        iter: 50);

    [Fact]
    public void The_order_of_stations_and_days_does_not_matter() => Gen.Select(Queries, RandomNetwork.Any, Gen.Int).Sample(
        (query, network, seed) =>
        {
            var expected = FromDays(query, network);
            var random = new Random(seed);
            foreach (var (_, days) in network.Stations)
            {
                Shuffle(random, days);
            }

            Shuffle(random, network.Stations);
            var shuffled = FromDays(query, network);
            Assert.Equal(expected.Bands, shuffled.Bands);
            for (var i = 0; i < expected.Cells.Length; i++)
            {
                Assert.Equal(expected.Cells[i].Value, shuffled.Cells[i].Value, 1e-9);

                // Deviations are summed in single precision.
                Assert.Equal(expected.Cells[i].Lower, shuffled.Cells[i].Lower, 1e-3);
                Assert.Equal(expected.Cells[i].Upper, shuffled.Cells[i].Upper, 1e-3);
            }
        },
        iter: 50);

    [Fact]
    public void Tile_pools_refuse_what_only_sheets_can_tell()
    {
        var query = new HeatmapQuery(null, "all", Months);
        Assert.Throws<ArgumentException>(() => new TilePool(query, BandPlan.Standard));
        Assert.Throws<ArgumentException>(() => new TilePool(query with { Statistic = Statistic.Median, Interval = IntervalChoice.None }, BandPlan.Standard));
    }

    internal static Heatmap FromDays(HeatmapQuery query, RandomNetwork network)
    {
        var pool = new DayPool(query, BandPlan.Standard);
        network.Stations.ForEach(station => pool.Add(station.Station, station.Days));
        return pool.ToHeatmap();
    }

    private static Heatmap FromTiles(HeatmapQuery query, RandomNetwork network)
    {
        var pool = new TilePool(query, BandPlan.Standard);
        foreach (var (station, days) in network.Stations)
        {
            var tiles = from day in days
                        group day.Cells by YearMonth.Of(day.Date) into month
                        let tile = MonthTile.FromSheets(query.Measure, month.ToList())
                        where tile is not null
                        select (month.Key, tile);
            pool.Add(station, [.. tiles]);
        }

        return pool.ToHeatmap();
    }

    private static void AssertEqual(PlainPool plain, Heatmap heatmap)
    {
        Assert.Equal(plain.Bands, heatmap.Bands);
        for (var band = 0; band < heatmap.Bands.Count; band++)
        {
            for (var hour = 0; hour < 24; hour++)
            {
                var (expected, cell) = (plain.Cell(heatmap.Bands[band], hour), heatmap[band, hour]);
                Assert.Equal((expected.Stations, expected.Days), (cell.Stations, cell.Days));
                Assert.Equal(expected.Value, cell.Value, 1e-9);
            }
        }
    }

    private static Gen<int> AnyOf(params int[] values) => Gen.Int[0, values.Length - 1].Select(i => values[i]);

    private static void Shuffle<T>(Random random, List<T> list)
    {
        for (var i = list.Count - 1; i > 0; i--)
        {
            var j = random.Next(i + 1);
            (list[i], list[j]) = (list[j], list[i]);
        }
    }
}
