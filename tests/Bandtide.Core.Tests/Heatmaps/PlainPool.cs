using System.Collections.Concurrent;
using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Core.Sun;
using Bandtide.Core.Time;

namespace Bandtide.Core.Tests.Heatmaps;

/// <summary>The definitions of the data contract, cell by cell in double precision and without regard to time: what pools are checked against.</summary>
internal sealed class PlainPool(HeatmapQuery query, RandomNetwork network)
{
    private static readonly ConcurrentDictionary<YearMonth, double> MeanEquations = new();

    private readonly ILookup<(short Band, int Hour), (Station Station, double Value)> values = (
        from station in network.Stations
        from day in station.Days
        from hour in Enumerable.Range(0, 24)
        from band in Enumerable.Range(0, day.Cells.BandCount)
        where day.Cells.Has(hour, band) && day.Cells[Quantity.Sweeps, hour, band] >= query.MinSweeps
        let value = Value(query.Measure, day.Cells, hour, band)
        where value is not null
        select (Key: (day.Cells.BandIds[band], Shown(query.Clock, hour, station.Station, day.Date)), Item: (station.Station, value.Value)))
        .ToLookup(cell => cell.Key, cell => cell.Item);

    /// <summary>The bands that have a value, by frequency.</summary>
    public List<Band> Bands => [.. BandPlan.Standard.Layer(query.Layer)
        .Where(band => Enumerable.Range(0, 24).Any(hour => Stations(band, hour).Count > 0)).OrderBy(band => band.LowHz)];

    /// <summary>Value, stations and station-days of a cell.</summary>
    public (double Value, int Stations, int Days) Cell(Band band, int hour)
    {
        var stations = Stations(band, hour);
        return (stations.Count == 0 ? double.NaN : Statistic(stations), stations.Count, stations.Sum(station => station.Values.Count));
    }

    private List<(string Voter, List<double> Values)> Stations(Band band, int hour) => [.. values[(band.Id, hour)]
        .GroupBy(cell => cell.Station, cell => cell.Value)
        .Where(station => station.Count() >= query.MinDays)
        .Select(station => (query.Vote == VoteUnit.Square ? station.Key.Square.ToString() : station.Key.Code, station.ToList()))];

    private double Statistic(List<(string Voter, List<double> Values)> stations)
    {
        var voters = stations.GroupBy(station => station.Voter, StringComparer.Ordinal).ToList();
        var means = voters.ConvertAll(voter => voter.Average(station => station.Values.Average()));
        return query.Statistic switch
        {
            Core.Heatmaps.Statistic.Mean => means.Average(),
            Core.Heatmaps.Statistic.Sd => Deviation(query.Station is null ? means : stations[0].Values),
            Core.Heatmaps.Statistic.Median => Quantile(voters, 0.5),
            Core.Heatmaps.Statistic.P10 => Quantile(voters, 0.1),
            _ => Quantile(voters, 0.9),
        };
    }

    private static double Deviation(List<double> values)
    {
        var mean = values.Average();
        return values.Count < 2 ? double.NaN : Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / (values.Count - 1));
    }

    // Each value stands at the middle of its weight; between two of them the quantile is on the straight line.
    private static double Quantile(List<IGrouping<string, (string Voter, List<double> Values)>> voters, double p)
    {
        var sorted = voters
            .SelectMany(voter => voter.SelectMany(station => station.Values.Select(value => (Value: value, Weight: 1.0 / station.Values.Count / voter.Count()))))
            .OrderBy(item => item.Value).ThenBy(item => item.Weight).ToList();
        var total = sorted.Sum(item => item.Weight);
        var middles = sorted.Select((item, i) => (sorted.Take(i).Sum(before => before.Weight) + item.Weight / 2) / total).ToList();
        var above = middles.FindIndex(middle => middle >= p);
        return above switch
        {
            -1 => sorted[^1].Value,
            0 => sorted[0].Value,
            _ => sorted[above - 1].Value
                + (sorted[above].Value - sorted[above - 1].Value) * (p - middles[above - 1]) / (middles[above] - middles[above - 1]),
        };
    }

    private static double? Value(Measure measure, CellGrid cells, int hour, int band)
    {
        double? Read(Quantity quantity, double steps) => cells[quantity, hour, band] is var value && value == CellGrid.Missing ? null : value / steps;
        return measure switch
        {
            Measure.Occupancy => Read(Quantity.Occupancy, 10_000),
            Measure.Signal => Read(Quantity.Signal, 100),
            // Rounded to its resolution, so that equal differences are equal numbers.
            Measure.Excess => Read(Quantity.Signal, 100) - Read(Quantity.Floor, 100) is { } excess ? Math.Round(excess, 2) : null,
            Measure.Level => Read(Quantity.Level, 100),
            Measure.LevelP90 => Read(Quantity.LevelP90, 100),
            Measure.Floor => Read(Quantity.Floor, 100),
            _ => Read(Quantity.Steady, 10_000),
        };
    }

    // The solar hour that holds the cell's midpoint, with the equation of time averaged over the days of the month.
    private static int Shown(HourClock clock, int hour, Station station, DateOnly date)
    {
        if (clock == HourClock.Utc)
        {
            return hour;
        }

        var solar = hour + 0.5 + station.Position.LongitudeDegrees / 15 + MeanEquations.GetOrAdd(YearMonth.Of(date), MeanEquation) / 60;
        return (int)Math.Floor(solar - 24 * Math.Floor(solar / 24));
    }

    private static double MeanEquation(YearMonth month) => Enumerable.Range(0, month.Days)
        .Average(day => EquationOfTime.Minutes(new(month.FirstDay.AddDays(day).ToDateTime(new(12, 0)), TimeSpan.Zero)));
}
