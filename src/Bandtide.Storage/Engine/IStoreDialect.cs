using System.Data.Common;
using Bandtide.Storage.Days;
using Bandtide.Storage.Tiles;

namespace Bandtide.Storage.Engine;

/// <summary>What differs between the providers: connections, transactions, lists as parameters and writing many rows at once.</summary>
/// <remarks>Every other statement is the same text for both.</remarks>
internal interface IStoreDialect
{
    /// <summary>An open connection, ready for use; closing it gives it back to the pool.</summary>
    ValueTask<DbConnection> OpenAsync(CancellationToken ct);

    /// <summary>Waits for this process's turn to write, in order of arrival; disposing ends the turn.</summary>
    ValueTask<IDisposable> EnterWriterAsync(CancellationToken ct);

    /// <summary>Begins a transaction that writes.</summary>
    ValueTask<DbTransaction> BeginWriteAsync(DbConnection connection, CancellationToken ct);

    /// <summary>Begins a transaction in which all reading sees one moment.</summary>
    ValueTask<DbTransaction> BeginSnapshotAsync(DbConnection connection, CancellationToken ct);

    /// <summary>Whether the work failed for a passing reason and may be done again from its start.</summary>
    bool IsPassing(Exception exception);

    /// <summary>Condition that a column is in a list of whole numbers given as a parameter.</summary>
    string InNumbers(string column, string parameter);

    /// <summary>Condition that a column is in a list of byte strings given as a parameter.</summary>
    string InBytes(string column, string parameter);

    /// <summary>A list of whole numbers as one parameter.</summary>
    DbParameter Numbers(string name, IReadOnlyCollection<int> values);

    /// <summary>A list of byte strings as one parameter.</summary>
    DbParameter Bytes(string name, IReadOnlyCollection<byte[]> values);

    /// <summary>A query that locks a station's row (<c>@station</c>) until the transaction ends and gives a row if there is such a station.</summary>
    string LockStation { get; }

    /// <summary>Makes days current, keeping those they supersede, with the tiles and counters of their months.</summary>
    Task WriteDaysAsync(StoreSession session, int stationId, IReadOnlyList<DayEntry> days, MonthTiles tiles, CancellationToken ct);

    /// <summary>Replaces all tiles of months and raises the months' counters.</summary>
    Task WriteTilesAsync(StoreSession session, int stationId, MonthTiles tiles, CancellationToken ct);

    /// <summary>Raises the change counters of months, given in ascending order.</summary>
    Task RaiseCountersAsync(StoreSession session, IReadOnlyList<int> months, CancellationToken ct);
}
