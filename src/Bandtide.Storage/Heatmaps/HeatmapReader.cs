using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Network;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Answers heatmap queries from month tiles, or from day sheets where the question needs them.</summary>
/// <remarks>
/// Tiles stay in memory unpacked, and answers from sheets stay finished, each under the state of the change counters they
/// were read at. The counters are read for every question, so that nobody gets an answer older than an upload that was
/// acknowledged before he asked.
/// </remarks>
public sealed class HeatmapReader
{
    // So many different questions are computed from sheets side by side; the same one is computed once.
    private const int Lanes = 8;

    private readonly StoreDatabase database;
    private readonly NetworkStore network;
    private readonly TileHeatmaps tiles;
    private readonly SheetHeatmaps sheets;
    private readonly AnswerCache answers;
    private readonly SemaphoreSlim[] lanes = [.. Enumerable.Range(0, Lanes).Select(_ => new SemaphoreSlim(1, 1))];

    internal HeatmapReader(StoreDatabase database, NetworkStore network, StoreOptions options)
    {
        (this.database, this.network) = (database, network);
        tiles = new(database, new(options.TileCacheBytes));
        sheets = new(database);
        answers = new(options.AnswerCacheBytes);
    }

    /// <summary>The revision alone, cheap: what an <c>ETag</c> is made of. <c>null</c>: no such station or region.</summary>
    public async Task<string?> RevisionAsync(HeatmapQuery query, CancellationToken ct) => (await SelectAsync(query, ct))?.Revision;

    /// <summary>The heatmap.</summary>
    public async Task<HeatmapOutcome> ReadAsync(HeatmapQuery query, CancellationToken ct)
    {
        if (await SelectAsync(query, ct) is not { } selection)
        {
            return new HeatmapOutcome.UnknownSelection(
                query.Station is { } station ? $"There is no station '{station}'." : $"There is no region '{query.Region}'.");
        }

        if (!query.NeedsSheets)
        {
            var (current, pooled) = await tiles.PoolAsync(selection, ct);
            return Judge(current, pooled);
        }

        return await FromSheetsAsync(selection, ct);
    }

    private async Task<HeatmapSelection?> SelectAsync(HeatmapQuery query, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(query);
        var (from, to) = HeatmapSelection.MonthNumbers(query.Period);
        var counters = await database.ReadAsync(session => ChangeCounters.ReadAsync(session, from, to, ct), ct);
        return HeatmapSelection.Of(query, await network.AtAsync(counters.Network, ct), counters);
    }

    private async Task<HeatmapOutcome> FromSheetsAsync(HeatmapSelection selection, CancellationToken ct)
    {
        var question = HeatmapQueryText.ToQueryString(selection.Query);
        if (answers.Find(question, selection.Revision) is { } ready)
        {
            return ready;
        }

        var lane = lanes[(uint)string.GetHashCode(question, StringComparison.Ordinal) % Lanes];
        await lane.WaitAsync(ct);
        try
        {
            if (answers.Find(question, selection.Revision) is { } meanwhile)
            {
                return meanwhile;
            }

            var (current, pooled) = await sheets.PoolAsync(selection, ct);
            var outcome = Judge(current, pooled);
            answers.Add(question, current.Revision, outcome);
            return outcome;
        }
        finally
        {
            lane.Release();
        }
    }

    private static HeatmapOutcome Judge(HeatmapSelection selection, PooledHeatmap pooled)
    {
        var query = selection.Query;
        var months = selection.Parts.SelectMany(part => part.Months).Order().ToList();
        var comparability = months.Count == 0 ? new(null, null)
            : LevelComparability.Judge(query.Measure, pooled.Stations, months[0].FirstDay, months[^1].LastDay);
        if (comparability.Refusal is { } refusal)
        {
            return new HeatmapOutcome.Refused("region", "units-mixed", refusal);
        }

        var days = 0;
        foreach (var cell in pooled.Heatmap.Cells)
        {
            days = Math.Max(days, cell.Days);
        }

        return new HeatmapOutcome.Answered(new(
            query, pooled.Heatmap, UnitOf(query.Measure, pooled.Stations), pooled.Stations, days, selection.Revision,
            comparability.Caution, HeatmapNotes.Of(selection, pooled)));
    }

    private static string UnitOf(Measure measure, IReadOnlyList<Station> stations)
    {
        var info = measure.Info();
        return info.IsShare ? "1" : info.IsGainDependent && stations.Count > 0 ? stations[0].Unit.Text() : "dB";
    }
}
