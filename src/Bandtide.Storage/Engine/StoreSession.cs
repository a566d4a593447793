using System.Data.Common;
using Bandtide.Storage.Model;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Engine;

/// <summary>One open connection, inside a transaction or not, for hand-written SQL and for Entity Framework alike.</summary>
internal sealed class StoreSession(
    IStoreDialect dialect, DbConnection connection, DbTransaction? transaction, DbContextOptions<BandtideContext> options)
{
    public IStoreDialect Dialect => dialect;

    public DbConnection Connection => connection;

    /// <summary>A command on this connection and transaction.</summary>
    public DbCommand Command(string sql)
    {
        var command = connection.CreateCommand();
        command.CommandText = sql;
        command.Transaction = transaction;
        return command;
    }

    /// <summary>A context on this connection and transaction; the caller disposes it.</summary>
    public async Task<BandtideContext> ContextAsync(CancellationToken ct)
    {
        var context = new BandtideContext(options);
        context.Database.SetDbConnection(connection);
        if (transaction is not null)
        {
            await context.Database.UseTransactionAsync(transaction, ct);
        }

        return context;
    }
}
