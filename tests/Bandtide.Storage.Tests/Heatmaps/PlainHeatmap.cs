using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;

namespace Bandtide.Storage.Tests.Heatmaps;

/// <summary>Heatmap cells straight from the sheets by the words of the contract, slowly and without any of the pooling code.</summary>
internal sealed class PlainHeatmap(HeatmapQuery query, IEnumerable<(Station Station, DateOnly Date, CellGrid Cells)> days)
{
    private readonly List<(Station Station, DateOnly Date, CellGrid Cells)> selected =
        [.. days.Where(day => Covers(query, day.Station, YearMonth.Of(day.Date)))];

    /// <summary>Value, stations and station-days of a cell; the value is NaN where there is none.</summary>
    public (double Value, int Stations, int Days) Cell(Band band, int hour)
    {
        var byStation = selected
            .Select(day => (day.Station, Value: ValueOf(day.Cells, band, (hour - Shift(day.Station, day.Date) + 48) % 24)))
            .Where(day => day.Value is not null)
            .GroupBy(day => day.Station, day => day.Value!.Value)
            .Where(station => station.Count() >= query.MinDays)
            .Select(station => (Station: station.Key, Values: station.ToList()))
            .ToList();
        return (Pool(byStation), byStation.Count, byStation.Sum(station => station.Values.Count));
    }

    private double Pool(List<(Station Station, List<double> Values)> stations)
    {
        if (stations.Count == 0)
        {
            return double.NaN;
        }

        var voters = stations.GroupBy(station => query.Vote == VoteUnit.Square ? station.Station.Square.ToString() : station.Station.Code).ToList();
        var means = voters.ConvertAll(voter => voter.Average(station => station.Values.Average()));
        return query.Statistic switch
        {
            Statistic.Mean => means.Average(),
            Statistic.Sd => Deviation(query.Station is null ? means : stations[0].Values),
            Statistic.Median => Quantile(voters, 0.5),
            Statistic.P10 => Quantile(voters, 0.1),
            _ => Quantile(voters, 0.9),
        };
    }

    private static double Deviation(List<double> values) => values.Count < 2 ? double.NaN
        : Math.Sqrt(values.Sum(value => Math.Pow(value - values.Average(), 2)) / (values.Count - 1));

    // Linear between the midpoints of cumulative weight, level beyond the outermost; among equals the lighter first.
    private static double Quantile(List<IGrouping<string, (Station Station, List<double> Values)>> voters, double p)
    {
        var weighted = voters
            .SelectMany(voter => voter.SelectMany(station => station.Values.Select(value => (value, Weight: 1.0 / station.Values.Count / voter.Count()))))
            .OrderBy(pair => Math.Round(pair.value, 6)).ThenBy(pair => pair.Weight).ToList();
        var total = weighted.Sum(pair => pair.Weight);
        var (cumulated, lastPlace, lastValue) = (0.0, double.NaN, double.NaN);
        foreach (var (value, weight) in weighted)
        {
            var place = (cumulated + weight / 2) / total;
            if (place >= p)
            {
                return double.IsNaN(lastPlace) ? value : lastValue + (value - lastValue) * (p - lastPlace) / (place - lastPlace);
            }

            (cumulated, lastPlace, lastValue) = (cumulated + weight, place, value);
        }

        return lastValue;
    }

    private double? ValueOf(CellGrid cells, Band band, int hour)
    {
        var place = cells.BandIds.IndexOf(band.Id);
        if (place < 0 || !cells.Has(hour, place) || cells[Quantity.Sweeps, hour, place] < query.MinSweeps)
        {
            return null;
        }

        double? Read(Quantity quantity, double unit) => cells[quantity, hour, place] is var value && value == CellGrid.Missing ? null : value * unit;
        return query.Measure switch
        {
            Measure.Occupancy => Read(Quantity.Occupancy, 1e-4),
            Measure.Signal => Read(Quantity.Signal, 0.01),
            Measure.Excess => Read(Quantity.Signal, 0.01) - Read(Quantity.Floor, 0.01),
            Measure.Level => Read(Quantity.Level, 0.01),
            Measure.LevelP90 => Read(Quantity.LevelP90, 0.01),
            Measure.Floor => Read(Quantity.Floor, 0.01),
            _ => Read(Quantity.Steady, 1e-4),
        };
    }

    private int Shift(Station station, DateOnly date) =>
        query.Clock == HourClock.Utc ? 0 : SolarClock.Shift(station.Position.LongitudeDegrees, YearMonth.Of(date));

    private static bool Covers(HeatmapQuery query, Station station, YearMonth month) => query.Period switch
    {
        Period.Months months => month >= months.From && month <= months.To,
        Period.SeasonOf season => SeasonCovers(season, query.Alignment == SeasonAlignment.Local && station.Position.LatitudeDegrees < 0, month),
        _ => false,
    };

    // Winter is December to February in the north, June to August in the south; December belongs to the year after.
    private static bool SeasonCovers(Period.SeasonOf period, bool south, YearMonth month)
    {
        var year = month.Month == 12 ? month.Year + 1 : month.Year;
        Season[] north = [Season.Winter, Season.Spring, Season.Summer, Season.Autumn];
        var season = north[(month.Month % 12 / 3 + (south ? 2 : 0)) % 4];
        return season == period.Season && year >= (period.FromYear ?? 0) && year <= (period.ToYear ?? 9999);
    }
}
