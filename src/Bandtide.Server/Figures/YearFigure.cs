using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using Bandtide.Storage.Heatmaps;

namespace Bandtide.Server.Figures;

/// <summary>The twelve months of a year side by side, on one scale and with the same rows.</summary>
/// <param name="Title">What is shown.</param>
/// <param name="Subtitle">Where and when.</param>
/// <param name="Months">January to December.</param>
/// <param name="Scale">Colours and words of the values.</param>
/// <param name="ScaleTitle">Name of the colour scale with its unit.</param>
/// <param name="Clock">Clock of the columns.</param>
/// <param name="Caption">Cautions that hold for any of the months.</param>
public sealed record YearFigure(
    string Title,
    string Subtitle,
    IReadOnlyList<MonthPlate> Months,
    ValueScale Scale,
    string ScaleTitle,
    HourClock Clock,
    IReadOnlyList<string> Caption)
{
    private static readonly HeatmapCell Nothing = new(double.NaN, double.NaN, double.NaN, 0, 0);

    /// <summary>Describes the answers of twelve months, which ask the same of the same stations.</summary>
    /// <param name="answers">January to December.</param>
    /// <param name="placeName">Name of the station or region.</param>
    /// <param name="year">The year.</param>
    public static YearFigure Of(IReadOnlyList<HeatmapAnswer> answers, string placeName, int year)
    {
        ArgumentNullException.ThrowIfNull(answers);
        var query = answers[0].Query;
        var measure = query.Measure.Info();
        var withData = answers.FirstOrDefault(answer => answer.Heatmap.Bands.Count > 0) ?? answers[0];
        var scale = ValueScale.For(query.Measure, query.Statistic, withData.Unit, answers.SelectMany(answer => HeatmapFigure.Values(answer.Heatmap)));
        var bands = answers.SelectMany(answer => answer.Heatmap.Bands).Distinct().OrderByDescending(band => band.LowHz).ToList();
        return new(
            $"{measure.Label}, {FigureWords.Name(query.Statistic)}",
            string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{placeName}, {year}"),
            [.. answers.Select((answer, index) => new MonthPlate(new YearMonth(year, index + 1), answer, [.. bands.Select(band => Row(answer.Heatmap, band))]))],
            scale,
            $"{measure.Label}, {scale.Unit}",
            query.Clock,
            [.. answers.Select(answer => answer.NotComparable).OfType<string>().Distinct(StringComparer.Ordinal).Select(reason => $"Not comparable: {reason}")]);
    }

    private static HeatmapRow Row(Heatmap heatmap, Core.Bands.Band band)
    {
        var index = heatmap.Bands.ToList().IndexOf(band);
        return new(band, [.. Enumerable.Range(0, 24).Select(hour => index < 0 ? Nothing : heatmap[index, hour])]);
    }
}
