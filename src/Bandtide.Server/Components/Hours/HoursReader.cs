using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using Bandtide.Server.Figures;
using Bandtide.Storage.Coverage;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components.Hours;

/// <summary>Reads what the Hours page shows.</summary>
internal sealed class HoursReader(NetworkStore network, HeatmapReader heatmaps, CoverageReader coverage, TimeProvider clock)
{
    /// <summary>The model of an address; <c>null</c> when it names a station or region that does not exist.</summary>
    public async Task<HoursModel?> ReadAsync(string uri, CancellationToken ct)
    {
        var view = await network.GetAsync(ct);
        var address = HoursAddress.Parse(uri, await NewestMonthAsync(ct));
        if (address.Query is not { } query)
        {
            return new(address, view, "", null, null, null, [.. address.Problems.Select(problem => problem.Message)]);
        }

        if (view.Select(query.Station, query.Region) is null)
        {
            return null;
        }

        var place = FigureWords.PlaceName(view, query);
        if (address.Shown == HoursView.Year)
        {
            return await YearAsync(address, view, place, ct);
        }

        return await heatmaps.ReadAsync(query, ct) switch
        {
            HeatmapOutcome.Answered { Answer: var answer } => new(address, view, place, answer, HeatmapFigure.Of(answer, place), null, []),
            HeatmapOutcome.Refused refused => new(address, view, place, null, null, null, [refused.Message]),
            _ => null,
        };
    }

    /// <summary>The month of the newest complete day, or the present one.</summary>
    public async Task<YearMonth> NewestMonthAsync(CancellationToken ct) =>
        YearMonth.Of((await coverage.LatestAsync(ct)).LastCompleteDate ?? DateOnly.FromDateTime(clock.GetUtcNow().UtcDateTime));

    private async Task<HoursModel?> YearAsync(HoursAddress address, NetworkView view, string place, CancellationToken ct)
    {
        var answers = new List<HeatmapAnswer>();
        var year = YearOf(address.Query!.Period, await NewestMonthAsync(ct));
        for (var month = 1; month <= 12; month++)
        {
            var query = address.Query with { Period = new Period.Months(new(year, month), new(year, month)), Interval = IntervalChoice.None };
            switch (await heatmaps.ReadAsync(query, ct))
            {
                case HeatmapOutcome.Answered { Answer: var answer }:
                    answers.Add(answer);
                    break;
                case HeatmapOutcome.Refused refused:
                    return new(address, view, place, null, null, null, [refused.Message]);
                default:
                    return null;
            }
        }

        return new(address, view, place, null, null, YearFigure.Of(answers, place, year), []);
    }

    private static int YearOf(Period period, YearMonth newest) => period switch
    {
        Period.Months months => months.To.Year,
        Period.SeasonOf season => season.ToYear ?? newest.Year,
        _ => newest.Year,
    };
}
