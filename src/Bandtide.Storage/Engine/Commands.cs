using System.Data.Common;

namespace Bandtide.Storage.Engine;

/// <summary>Short forms for hand-written commands.</summary>
internal static class Commands
{
    /// <summary>Adds a plain value as a parameter.</summary>
    public static void Add(this DbCommand command, string name, object value)
    {
        var parameter = command.CreateParameter();
        (parameter.ParameterName, parameter.Value) = (name, value);
        command.Parameters.Add(parameter);
    }

    /// <summary>Runs a query and makes one item of each row.</summary>
    public static async Task<List<T>> ListAsync<T>(this DbCommand command, Func<DbDataReader, T> item, CancellationToken ct)
    {
        var items = new List<T>();
        await using var reader = await command.ExecuteReaderAsync(ct);
        while (await reader.ReadAsync(ct))
        {
            items.Add(item(reader));
        }

        return items;
    }
}
