using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using Bandtide.Storage.Model;

namespace Bandtide.Storage.Engine;

/// <summary>Change counters at one moment: the network's and those of some months. What holds for them holds until one moves.</summary>
/// <param name="Network">Counter of stations, setups, regions and bands.</param>
/// <param name="Months">Counters by month number; a month without a row never had data.</param>
internal sealed record ChangeCounters(long Network, IReadOnlyDictionary<int, long> Months)
{
    // Goes up when the same data would give another answer than before.
    private const int AlgorithmVersion = 1;

    /// <summary>The counter of stations, setups, regions and bands.</summary>
    public static async Task<long> NetworkAsync(StoreSession session, CancellationToken ct)
    {
        await using var command = session.Command("SELECT counter FROM month_change WHERE month = 0");
        return await command.ExecuteScalarAsync(ct) is long counter ? counter : throw NoNetworkRow();
    }

    /// <summary>The network's counter and those of all months in a range of month numbers, both included.</summary>
    public static async Task<ChangeCounters> ReadAsync(StoreSession session, int from, int to, CancellationToken ct)
    {
        await using var command = session.Command("SELECT month, counter FROM month_change WHERE month = 0 OR month BETWEEN @from AND @to");
        command.Add("@from", from);
        command.Add("@to", to);
        var rows = await command.ListAsync(row => (Month: row.GetInt32(0), Counter: row.GetInt64(1)), ct);
        var months = rows.ToDictionary(row => row.Month, row => row.Counter);
        return months.Remove(MonthChangeRow.Network, out var network) ? new(network, months) : throw NoNetworkRow();
    }

    /// <summary>A short opaque text that differs when the network's counter or one of the months' differs.</summary>
    public string Revision(IEnumerable<int> months)
    {
        var text = new StringBuilder().Append(CultureInfo.InvariantCulture, $"{AlgorithmVersion};{Network}");
        foreach (var month in months.Where(Months.ContainsKey).Distinct().Order())
        {
            text.Append(CultureInfo.InvariantCulture, $";{month}:{Months[month]}");
        }

        return Convert.ToHexStringLower(SHA256.HashData(Encoding.ASCII.GetBytes(text.ToString())).AsSpan(0, 8));
    }

    private static InvalidDataException NoNetworkRow() => new("The network's row of month_change is missing: the store is damaged.");
}
