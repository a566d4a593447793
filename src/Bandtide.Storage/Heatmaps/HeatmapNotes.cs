using System.Globalization;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;

namespace Bandtide.Storage.Heatmaps;

/// <summary>What a reader must know about a heatmap, in sentences.</summary>
internal static class HeatmapNotes
{
    private const int StationsForInterval = 3;

    /// <summary>All that applies, or <c>null</c>.</summary>
    public static string? Of(HeatmapSelection selection, PooledHeatmap pooled)
    {
        var notes = pooled.Stations.Count == 0
            ? [NothingBecause(selection)]
            : new[] { Season(selection, pooled.Stations), Interval(selection.Query, pooled), FewData(pooled.Heatmap) }.OfType<string>().ToList();
        return notes.Count == 0 ? null : string.Join(' ', notes);
    }

    private static string NothingBecause(HeatmapSelection selection)
    {
        if (selection.Stations.Count == 0)
        {
            return "There is no station in this region.";
        }

        if (selection.Parts.All(part => part.Months.Count == 0))
        {
            return "Nobody in the network reported anything in this period.";
        }

        var what = $"\"{selection.Query.Measure.Info().Label}\" in this layer for this period.";
        return selection.Query.Station is null ? $"No station of this region reported {what}" : $"This station did not report {what}";
    }

    private static string? Season(HeatmapSelection selection, IReadOnlyList<Station> stations)
    {
        if (selection.Query is not { Period: Period.SeasonOf, Alignment: SeasonAlignment.Local })
        {
            return null;
        }

        var near = stations.Where(station => !Seasons.IsMeaningful(station.Position.LatitudeDegrees)).Select(station => station.Code).ToList();
        return near.Count == 0 ? null : string.Create(
            CultureInfo.InvariantCulture,
            $"A local season means nothing within {Seasons.MeaninglessWithinDegrees} degrees of the equator: {string.Join(", ", near)}.");
    }

    private static string? Interval(HeatmapQuery query, PooledHeatmap pooled)
    {
        if (query is not { Station: null, Statistic: Statistic.Mean, Interval: IntervalChoice.Auto })
        {
            return null;
        }

        var voters = query.Vote == VoteUnit.Station ? pooled.Stations.Count : pooled.Stations.Select(station => station.Square).Distinct().Count();
        return voters >= StationsForInterval ? null
            : $"The interval rests on fewer than three {(query.Vote == VoteUnit.Station ? "stations" : "squares")}.";
    }

    private static string? FewData(Heatmap heatmap)
    {
        foreach (var cell in heatmap.Cells)
        {
            if (cell.Days >= Heatmap.FewDays)
            {
                return null;
            }
        }

        return string.Create(CultureInfo.InvariantCulture, $"Few data: fewer than {Heatmap.FewDays} station-days in every cell.");
    }
}
