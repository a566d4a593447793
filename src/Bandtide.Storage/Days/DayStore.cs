using Bandtide.Core.Stations;

namespace Bandtide.Storage.Days;

/// <summary>Day sheets with their revisions. Every write recomputes the month tiles it touches in its own transaction.</summary>
public sealed class DayStore
{
    /// <summary>Stores days of one station in one durable transaction and answers one receipt per day, in order.</summary>
    /// <param name="station">The station.</param>
    /// <param name="days">Distinct dates.</param>
    /// <param name="restoreWithdrawn">Whether a withdrawn day is created anew (PUT, or bulk with <c>restore=true</c>).</param>
    /// <param name="ct">Cancels before the commit; after it the receipts are always returned.</param>
    public Task<IReadOnlyList<DayReceipt>> StoreAsync(
        Station station, IReadOnlyList<PendingDay> days, bool restoreWithdrawn, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>One day with its cells, current or an old revision; <c>null</c> when there is none.</summary>
    public Task<StoredDay?> FindAsync(Station station, DateOnly date, int? revision, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>Withdraws a day. <c>null</c>: never stored; otherwise whether it was current before (false: withdrawn already).</summary>
    public Task<bool?> WithdrawAsync(Station station, DateOnly date, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>Current days from <paramref name="from"/> to <paramref name="to"/>, both included, by date; without cells, withdrawn ones left out.</summary>
    public Task<IReadOnlyList<StoredDay>> ListAsync(Station station, DateOnly? from, DateOnly? to, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>All revisions of a day, oldest first, without cells; empty when there is none.</summary>
    public Task<IReadOnlyList<StoredDay>> RevisionsAsync(Station station, DateOnly date, CancellationToken ct) => throw new NotSupportedException("Not built yet.");
}
