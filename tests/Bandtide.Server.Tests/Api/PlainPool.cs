using System.Text.Json.Nodes;

namespace Bandtide.Server.Tests.Api;

/// <summary>Pools day sheets as read back over HTTP, straight from the sentences of the data contract: slow, and without any of the server's code.</summary>
/// <param name="sheets">Station, vote (its code or its square) and one sheet's JSON for each day.</param>
internal sealed class PlainPool(IReadOnlyList<(string Station, string Vote, JsonNode Sheet)> sheets)
{
    /// <summary>The value of a cell, or <c>null</c>; stations and station-days behind it.</summary>
    public (double? Value, int Stations, int Days) Cell(string band, int hour, string measure, string stat, int minDays = 1, int minSweeps = 1)
    {
        var days = sheets
            .SelectMany(entry => entry.Sheet["cells"]!.AsArray()
                .Where(cell => string.Equals(cell!["band"]!.GetValue<string>(), band, StringComparison.Ordinal) && cell["hour"]!.GetValue<int>() == hour && cell["sweeps"]!.GetValue<int>() >= minSweeps)
                .Select(cell => (entry.Station, entry.Vote, Value: Of(cell!, measure))))
            .Where(day => day.Value is not null)
            .Select(day => (day.Station, day.Vote, Value: day.Value!.Value))
            .ToList();
        var stations = days.GroupBy(day => day.Station, StringComparer.Ordinal).Where(group => group.Count() >= minDays).ToList();
        if (stations.Count == 0)
        {
            return (null, 0, 0);
        }

        // One vote: the mean of its stations' means over their days.
        var votes = stations.GroupBy(group => group.First().Vote, StringComparer.Ordinal)
            .Select(vote => vote.Average(station => station.Average(day => day.Value))).ToList();
        double? value = stat switch
        {
            "mean" => votes.Average(),
            "sd" => Deviation(sheets.Select(entry => entry.Station).Distinct(StringComparer.Ordinal).Count() > 1 ? votes : [.. stations[0].Select(day => day.Value)]),
            "median" => Quantile(stations, 0.5),
            "p10" => Quantile(stations, 0.1),
            _ => Quantile(stations, 0.9),
        };
        return (value, stations.Count, stations.Sum(station => station.Count()));
    }

    private static double? Of(JsonNode cell, string measure)
    {
        double? Number(string name) => cell[name]?.GetValue<double>();
        return measure switch
        {
            // Rounded, so that equal differences are equal.
            "excess" => Number("signal") is { } signal && Number("floor") is { } floor ? Math.Round(signal - floor, 2) : null,
            "level-p90" => Number("levelP90"),
            _ => Number(measure),
        };
    }

    private static double? Deviation(List<double> values)
    {
        if (values.Count < 2)
        {
            return null;
        }

        var mean = values.Average();
        return Math.Sqrt(values.Sum(value => (value - mean) * (value - mean)) / (values.Count - 1));
    }

    // Station-days weigh 1/(days of their station); linear between the midpoints of cumulative weight. Among equal values,
    // where the contract leaves the order open, the lighter come first.
    private static double Quantile(List<IGrouping<string, (string Station, string Vote, double Value)>> stations, double share)
    {
        var sorted = stations.SelectMany(station => station.Select(day => (day.Value, Weight: 1.0 / station.Count()))).OrderBy(day => day.Value).ThenBy(day => day.Weight).ToList();
        var total = sorted.Sum(day => day.Weight);
        var (before, last) = (0.0, (Place: double.NegativeInfinity, sorted[0].Value));
        foreach (var (value, weight) in sorted)
        {
            var place = (before + weight / 2) / total;
            if (place >= share)
            {
                return double.IsNegativeInfinity(last.Place) ? value : last.Value + (value - last.Value) * (share - last.Place) / (place - last.Place);
            }

            (before, last) = (before + weight, (place, value));
        }

        return last.Value;
    }
}
