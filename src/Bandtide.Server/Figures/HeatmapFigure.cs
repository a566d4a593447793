using Bandtide.Core.Heatmaps;
using Bandtide.Storage.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>The one description of a heatmap's picture: every renderer draws from this and adds no fact of its own.</summary>
/// <param name="Title">What is shown, such as <c>Occupancy, mean</c>.</param>
/// <param name="Subtitle">Where and when, such as <c>All stations, June 2026</c>.</param>
/// <param name="Caption">Sentences a reader must know: what stands behind the values, daylight, cautions.</param>
/// <param name="Clock">Clock of the columns.</param>
/// <param name="Rows">Rows from top to bottom: the highest band first, as frequency rises upwards.</param>
/// <param name="Scale">Colours and words of the values.</param>
/// <param name="ScaleTitle">Name of the colour scale with its unit.</param>
/// <param name="Daylight">The strip above the columns, or <c>null</c>.</param>
public sealed record HeatmapFigure(
    string Title,
    string Subtitle,
    IReadOnlyList<string> Caption,
    HourClock Clock,
    IReadOnlyList<HeatmapRow> Rows,
    ValueScale Scale,
    string ScaleTitle,
    Daylight? Daylight)
{
    /// <summary>Name of the columns.</summary>
    public string HourTitle => Clock == HourClock.Utc ? "Hour, UTC" : "Hour, solar time";

    /// <summary>Describes an answer.</summary>
    /// <param name="answer">The answer.</param>
    /// <param name="placeName">Name of the station or region for people: see <see cref="FigureWords.PlaceName"/>.</param>
    /// <param name="scale">A scale shared with other figures, or <c>null</c> for the answer's own.</param>
    public static HeatmapFigure Of(HeatmapAnswer answer, string placeName, ValueScale? scale = null)
    {
        ArgumentNullException.ThrowIfNull(answer);
        var (query, heatmap) = (answer.Query, answer.Heatmap);
        var measure = query.Measure.Info();
        scale ??= ValueScale.For(query.Measure, query.Statistic, answer.Unit, Values(heatmap));
        var daylight = Daylight.Of(query, answer.Stations);
        return new(
            $"{measure.Label}, {FigureWords.Name(query.Statistic)}",
            $"{placeName}, {Sentence(query.Period)}",
            [.. Captions(answer, daylight)],
            query.Clock,
            [.. Enumerable.Range(0, heatmap.Bands.Count).Reverse().Select(band => Row(heatmap, band))],
            scale,
            $"{measure.Label}, {scale.Unit}",
            daylight);
    }

    /// <summary>The values of a heatmap that has any.</summary>
    public static IEnumerable<double> Values(Heatmap heatmap) => heatmap.Cells.ToArray().Select(cell => cell.Value);

    /// <summary>A cell in one line: value, interval, stations and days, or that there is nothing.</summary>
    public string Describe(HeatmapCell cell)
    {
        if (cell.Days == 0)
        {
            return "not observed";
        }

        var value = double.IsNaN(cell.Value) ? "no spread of fewer than two" : Scale.Text(cell.Value);
        var interval = double.IsNaN(cell.Lower)
            ? ""
            : $", 95 % interval {Scale.Number(cell.Lower)} to {Scale.Number(cell.Upper)}";
        return $"{value}{interval}; {FigureWords.Count(cell.Stations, "station")}, {FigureWords.Count(cell.Days, "station-day")}";
    }

    private static HeatmapRow Row(Heatmap heatmap, int band) =>
        new(heatmap.Bands[band], [.. Enumerable.Range(0, 24).Select(hour => heatmap[band, hour])]);

    private static string Sentence(Period period) =>
        FigureWords.Name(period) is var name && period is Period.SeasonOf ? char.ToLowerInvariant(name[0]) + name[1..] : name;

    private static IEnumerable<string> Captions(HeatmapAnswer answer, Daylight? daylight)
    {
        if (answer.Heatmap.Bands.Count > 0)
        {
            yield return Behind(answer);
        }

        if (answer.Query is { Clock: HourClock.Solar, Station: null } && answer.Heatmap.Bands.Count > 0)
        {
            yield return "Columns are hours of each station's own solar time: noon is when the Sun is highest there.";
        }

        if (daylight is not null && answer.Heatmap.Bands.Count > 0)
        {
            yield return daylight.Sentence;
        }

        if (answer.NotComparable is { } reason)
        {
            yield return $"Not comparable: {reason}";
        }

        if (answer.Note is { } note)
        {
            yield return note;
        }
    }

    private static string Behind(HeatmapAnswer answer)
    {
        var (query, statistic) = (answer.Query, FigureWords.Capital(FigureWords.Name(answer.Query.Statistic)));
        if (query.Station is not null)
        {
            return $"{statistic} over {FigureWords.Count(answer.StationDays, "day")} of one station.";
        }

        var stations = FigureWords.Count(answer.Stations.Count, "station");
        var days = FigureWords.Count(answer.StationDays, "station-day");
        var voter = query.Vote == VoteUnit.Square ? "square" : "station";
        return query.Statistic switch
        {
            Statistic.Mean => $"{stations}, {days}: mean over days at each station, then over {voter}s, one vote each.",
            Statistic.Sd => $"{stations}, {days}: standard deviation between the means of {voter}s.",
            _ => $"{stations}, {days}: {FigureWords.Name(query.Statistic)} over station-days, every {voter} weighing the same.",
        };
    }
}
