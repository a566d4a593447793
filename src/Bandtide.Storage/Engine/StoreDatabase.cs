using Bandtide.Storage.Model;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Engine;

/// <summary>Runs work on the store: plain reads, reads of one moment, and durable writes that are repeated on passing failures.</summary>
internal sealed class StoreDatabase(IStoreDialect dialect, DbContextOptions<BandtideContext> options)
{
    private const int Attempts = 5;

    public IStoreDialect Dialect => dialect;

    /// <summary>A context with a connection of its own.</summary>
    public BandtideContext CreateContext() => new(options);

    /// <summary>Reads without a transaction: each statement sees the newest state.</summary>
    public Task<T> ReadAsync<T>(Func<StoreSession, Task<T>> work, CancellationToken ct) => RepeatAsync(async () =>
    {
        await using var connection = await dialect.OpenAsync(ct);
        return await work(new(dialect, connection, null, options));
    }, ct);

    /// <summary>Reads in a transaction in which all statements see one moment.</summary>
    public Task<T> SnapshotAsync<T>(Func<StoreSession, Task<T>> work, CancellationToken ct) => RepeatAsync(async () =>
    {
        await using var connection = await dialect.OpenAsync(ct);
        await using var transaction = await dialect.BeginSnapshotAsync(connection, ct);
        var result = await work(new(dialect, connection, transaction, options));
        await transaction.CommitAsync(ct);
        return result;
    }, ct);

    /// <summary>
    /// Writes in one durable transaction. The work must be safe to repeat: it is done again from its start when the
    /// database asks for it or the connection was lost.
    /// </summary>
    /// <param name="work">Gives its result and whether to keep what it wrote.</param>
    /// <param name="ct">Cancels up to the commit, never during it.</param>
    public Task<T> WriteAsync<T>(Func<StoreSession, Task<(T Result, bool Keep)>> work, CancellationToken ct) => RepeatAsync(async () =>
    {
        using var turn = await dialect.EnterWriterAsync(ct);
        await using var connection = await dialect.OpenAsync(ct);
        await using var transaction = await dialect.BeginWriteAsync(connection, ct);
        var (result, keep) = await work(new(dialect, connection, transaction, options));
        if (keep)
        {
            ct.ThrowIfCancellationRequested();
            await transaction.CommitAsync(CancellationToken.None);
        }

        return result;
    }, ct);

    private async Task<T> RepeatAsync<T>(Func<Task<T>> work, CancellationToken ct)
    {
        for (var attempt = 1; ; attempt++)
        {
            try
            {
                return await work();
            }
            catch (Exception exception) when (attempt < Attempts && dialect.IsPassing(exception) && !ct.IsCancellationRequested)
            {
                await Task.Delay(TimeSpan.FromMilliseconds(20 << attempt), ct);
            }
        }
    }
}
