using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Network;

namespace Bandtide.Storage.Heatmaps;

/// <summary>A query resolved at one moment: whose data, of which months, at which state.</summary>
internal sealed class HeatmapSelection
{
    private HeatmapSelection(HeatmapQuery query, NetworkView network, IReadOnlyList<Station> stations, ChangeCounters counters)
    {
        (Query, Network, Stations, Counters) = (query, network, stations, counters);
        Parts = [.. stations
            .GroupBy(station => query.Period is Period.SeasonOf ? Seasons.HemisphereOf(station.Position.LatitudeDegrees) : Hemisphere.North)
            .OrderBy(group => group.Key)
            .Select(group => new SelectionPart([.. group], MonthsWithData(group.Key)))];
        Revision = counters.Revision(Parts.SelectMany(part => part.Months).Select(month => month.Number));
    }

    public HeatmapQuery Query { get; }

    public NetworkView Network { get; }

    public IReadOnlyList<Station> Stations { get; }

    public ChangeCounters Counters { get; }

    public IReadOnlyList<SelectionPart> Parts { get; }

    public string Revision { get; }

    /// <summary>Resolves a query; <c>null</c> when there is no such station or region.</summary>
    public static HeatmapSelection? Of(HeatmapQuery query, NetworkView network, ChangeCounters counters) =>
        network.Select(query.Station, query.Region) is { } stations
            ? new(query, network, stations, counters with { Network = network.Version })
            : null;

    /// <summary>The range of month numbers that a period can touch in either hemisphere.</summary>
    public static (int From, int To) MonthNumbers(Period period) => period switch
    {
        Period.Months months => (months.From.Number, months.To.Number),

        // A season's year reaches from December of the year before to December of the year itself.
        Period.SeasonOf season => (
            season.FromYear is { } first ? 12 * first - 1 : 1,
            season.ToYear is { } last ? 12 * last + 11 : int.MaxValue),
        _ => throw new ArgumentOutOfRangeException(nameof(period)),
    };

    /// <summary>The same selection at the state another transaction sees.</summary>
    public HeatmapSelection At(ChangeCounters counters) => new(Query, Network, Stations, counters with { Network = Network.Version });

    private List<YearMonth> MonthsWithData(Hemisphere hemisphere) => Counters.Months.Count == 0
        ? []
        : [.. PeriodMonths.For(
                Query.Period, hemisphere, Query.Alignment,
                YearMonth.FromNumber(Counters.Months.Keys.Min()), YearMonth.FromNumber(Counters.Months.Keys.Max()))
            .Where(month => Counters.Months.ContainsKey(month.Number))];
}
