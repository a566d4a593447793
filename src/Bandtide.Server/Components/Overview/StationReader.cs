using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Server.Components.Hours;
using Bandtide.Server.Figures;
using Bandtide.Storage.Coverage;
using Bandtide.Storage.Days;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components.Overview;

/// <summary>Reads what a station's page shows.</summary>
internal sealed class StationReader(NetworkStore network, DayStore days, CoverageReader coverage, HeatmapReader heatmaps)
{
    private const int MostRecent = 14;

    /// <summary>The model of a station; <c>null</c> when there is no such station.</summary>
    /// <param name="code">Code of the station.</param>
    /// <param name="historyDay">A day whose revisions are to be shown.</param>
    /// <param name="ct">Cancels.</param>
    public async Task<StationModel?> ReadAsync(string code, DateOnly? historyDay, CancellationToken ct)
    {
        var view = await network.GetAsync(ct);
        if (view.FindStation(code) is not { } station)
        {
            return null;
        }

        var regions = view.Regions.Where(region => region.Stations.Any(member => member.Id == station.Id)).ToList();
        var history = historyDay is { } day ? await days.RevisionsAsync(station, day, ct) : [];
        var stored = await days.ListAsync(station, null, null, ct);
        if (stored.Count == 0)
        {
            return new(station, regions, 0, null, [], null, null, HoursAddress.Path, historyDay, [.. history.Reverse()]);
        }

        var (first, last) = (stored[0].Date, stored[^1].Date);
        var strips = await coverage.ReadAsync(code, null, new(first.Year, 1), new(last.Year, 12), ct);
        var (figure, address) = await MonthAsync(station, YearMonth.Of(last), ct);
        return new(
            station, regions, stored.Count, first, [.. stored.Reverse().Take(MostRecent)], strips, figure, address, historyDay, [.. history.Reverse()]);
    }

    private async Task<(HeatmapFigure? Figure, string Address)> MonthAsync(Station station, YearMonth month, CancellationToken ct)
    {
        var query = new HeatmapQuery(station.Code, null, new Period.Months(month, month));
        var figure = await heatmaps.ReadAsync(query, ct) is HeatmapOutcome.Answered { Answer: var answer } ? HeatmapFigure.Of(answer, station.Name) : null;
        return (figure, HoursAddress.Of(query));
    }
}
