using Bandtide.Core.Stations;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Network;

namespace Bandtide.Storage.Days;

/// <summary>Day sheets with their revisions. Every write recomputes the month tiles it touches in its own transaction.</summary>
public sealed class DayStore
{
    private readonly StoreDatabase database;
    private readonly NetworkStore network;
    private readonly TimeProvider clock;

    internal DayStore(StoreDatabase database, NetworkStore network, TimeProvider clock) =>
        (this.database, this.network, this.clock) = (database, network, clock);

    /// <summary>Stores days of one station in one durable transaction and answers one receipt per day, in order.</summary>
    /// <param name="station">The station.</param>
    /// <param name="days">Distinct dates.</param>
    /// <param name="restoreWithdrawn">Whether a withdrawn day is created anew (PUT, or bulk with <c>restore=true</c>).</param>
    /// <param name="ct">Cancels before the commit; after it the receipts are always returned.</param>
    /// <exception cref="ArgumentException">A date twice.</exception>
    public async Task<IReadOnlyList<DayReceipt>> StoreAsync(
        Station station, IReadOnlyList<PendingDay> days, bool restoreWithdrawn, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        ArgumentNullException.ThrowIfNull(days);
        if (days.Count == 0)
        {
            return [];
        }

        // All that needs no lock comes before the transaction.
        var plan = (await network.LatestAsync(ct)).Plan;
        var upload = new DayUpload(station, days, restoreWithdrawn, plan, clock.GetUtcNow());
        var (decisions, copies) = await database.WriteAsync(async session =>
        {
            var writer = new DayWriter(session, station.Id);
            var state = await writer.LockAsync(upload.Dates, upload.Checksums, ct);
            var decided = upload.Decide(state.Heads);
            var changes = upload.ChangesOf(decided);
            if (changes.Count > 0)
            {
                await writer.ApplyAsync(changes, ct);
            }

            return ((decided, state.EarliestCopies), changes.Count > 0);
        }, ct);

        return upload.Receipts(decisions, copies);
    }

    /// <summary>One day with its cells, current or an old revision; <c>null</c> when there is none.</summary>
    public Task<StoredDay?> FindAsync(Station station, DateOnly date, int? revision, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        return database.ReadAsync(session => new DayQueries(session, station.Id).FindAsync(date, revision, ct), ct);
    }

    /// <summary>Withdraws a day. <c>null</c>: never stored; otherwise whether it was current before (false: withdrawn already).</summary>
    public async Task<bool?> WithdrawAsync(Station station, DateOnly date, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        var day = EpochDay.Of(date);
        var now = clock.GetUtcNow().ToUnixTimeMilliseconds();
        return await database.WriteAsync<bool?>(async session =>
        {
            var writer = new DayWriter(session, station.Id);
            if (!(await writer.LockAsync([day], [], ct)).Heads.TryGetValue(day, out var head))
            {
                return (null, false);
            }

            if (head.Checksum is null)
            {
                return (false, false);
            }

            await writer.ApplyAsync([new(new(day, head.Revision + 1, now, null), null)], ct);
            return (true, true);
        }, ct);
    }

    /// <summary>Current days from <paramref name="from"/> to <paramref name="to"/>, both included, by date; without cells, withdrawn ones left out.</summary>
    public Task<IReadOnlyList<StoredDay>> ListAsync(Station station, DateOnly? from, DateOnly? to, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        return database.ReadAsync(session => new DayQueries(session, station.Id).ListAsync(from, to, ct), ct);
    }

    /// <summary>All revisions of a day, oldest first, without cells; empty when there is none.</summary>
    public Task<IReadOnlyList<StoredDay>> RevisionsAsync(Station station, DateOnly date, CancellationToken ct)
    {
        ArgumentNullException.ThrowIfNull(station);
        return database.SnapshotAsync(session => new DayQueries(session, station.Id).RevisionsAsync(date, ct), ct);
    }
}
