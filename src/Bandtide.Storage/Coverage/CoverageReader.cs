using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Network;

namespace Bandtide.Storage.Coverage;

/// <summary>Says who reported when, from the tables' own columns: no sheet is unpacked.</summary>
public sealed class CoverageReader
{
    private readonly StoreDatabase database;
    private readonly NetworkStore network;
    private readonly TimeProvider clock;

    internal CoverageReader(StoreDatabase database, NetworkStore network, TimeProvider clock) =>
        (this.database, this.network, this.clock) = (database, network, clock);

    /// <summary>Coverage of a station or a region over whole months, both included; <c>null</c> when there is no such station or region.</summary>
    /// <param name="station">Code of a station, or <c>null</c>.</param>
    /// <param name="region">Code of a region, where <paramref name="station"/> is <c>null</c>.</param>
    /// <param name="from">First month.</param>
    /// <param name="to">Last month, not before the first.</param>
    /// <param name="ct">Cancels.</param>
    public async Task<CoverageAnswer?> ReadAsync(string? station, string? region, YearMonth from, YearMonth to, CancellationToken ct)
    {
        var view = await network.GetAsync(ct);
        if (view.Select(station, region) is not { } stations)
        {
            return null;
        }

        var (first, last) = (from.FirstDay, to.LastDay);
        var days = stations.ToDictionary(member => member.Id, _ => new CoverageDay?[last.DayNumber - first.DayNumber + 1]);
        var counters = await database.SnapshotAsync(async session =>
        {
            await FillAsync(session, days, EpochDay.Of(first), EpochDay.Of(last), ct);
            return await ChangeCounters.ReadAsync(session, from.Number, to.Number, ct);
        }, ct);

        // The view may be newer or older than the snapshot by a moment; its own version is what the answer was made from.
        return new(
            stations, first, last, [.. stations.Select(member => days[member.Id])],
            (counters with { Network = view.Version }).Revision(counters.Months.Keys));
    }

    /// <summary>Who has reported lately.</summary>
    public async Task<NetworkReport> LatestAsync(CancellationToken ct)
    {
        var stations = (await network.GetAsync(ct)).Stations.ToDictionary(station => station.Id);
        var today = EpochDay.Of(DateOnly.FromDateTime(clock.GetUtcNow().UtcDateTime));
        var (complete, newest) = await database.SnapshotAsync(async session =>
            (await NewestAsync(session, today - 1, ct), await NewestAsync(session, EpochDay.Of(DateOnly.MaxValue), ct)), ct);
        var last = complete.Count == 0 ? (int?)null : complete.Max(row => row.Date);
        return new(
            last is { } date ? EpochDay.ToDate(date) : null,
            [.. complete.Where(row => row.Date == last && stations.ContainsKey(row.Station)).Select(row => stations[row.Station])
                .OrderBy(station => station.Code, StringComparer.Ordinal)],
            [.. newest.Where(row => stations.ContainsKey(row.Station))
                .Select(row => new StationReport(
                    stations[row.Station], EpochDay.ToDate(row.Date), DateTimeOffset.FromUnixTimeMilliseconds(row.ReceivedAt)))
                .OrderBy(report => report.Station.Code, StringComparer.Ordinal)]);
    }

    private static async Task FillAsync(StoreSession session, Dictionary<int, CoverageDay?[]> days, int first, int last, CancellationToken ct)
    {
        await using var command = session.Command(
            $"""
            SELECT station_id, date, cell_count, hours_mask, band_count FROM day_sheet
            WHERE {session.Dialect.InNumbers("station_id", "@stations")} AND date BETWEEN @first AND @last
            """);
        command.Parameters.Add(session.Dialect.Numbers("@stations", days.Keys));
        command.Add("@first", first);
        command.Add("@last", last);
        await using var reader = await command.ExecuteReaderAsync(ct);
        while (await reader.ReadAsync(ct))
        {
            var cells = reader.GetInt32(2);
            days[reader.GetInt32(0)][reader.GetInt32(1) - first] = new(reader.GetInt32(3), cells, reader.GetInt32(4), cells == 0);
        }
    }

    // Each station is looked up by itself in the index; no two stations' rows meet. CROSS JOIN keeps SQLite to this order.
    private static async Task<List<(int Station, int Date, long ReceivedAt)>> NewestAsync(StoreSession session, int latest, CancellationToken ct)
    {
        await using var command = session.Command(
            """
            SELECT day.station_id, day.date, day.received_at FROM station CROSS JOIN day_sheet AS day
            WHERE day.station_id = station.id
            AND day.date = (SELECT max(date) FROM day_sheet WHERE station_id = station.id AND cell_count > 0 AND date <= @latest)
            """);
        command.Add("@latest", latest);
        return await command.ListAsync(row => (row.GetInt32(0), row.GetInt32(1), row.GetInt64(2)), ct);
    }
}
