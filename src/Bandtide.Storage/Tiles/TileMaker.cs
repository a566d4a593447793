using System.Data.Common;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;
using Bandtide.Storage.Days;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Tiles;

/// <summary>Makes month tiles from day sheets.</summary>
internal static class TileMaker
{
    private static readonly Measure[] Measures = Enum.GetValues<Measure>();

    /// <summary>The tiles that a month's sheets give: one for each measure that any of them has.</summary>
    public static IEnumerable<PackedTile> TilesOf(int month, IReadOnlyList<CellGrid> sheets) =>
        from measure in Measures
        let tile = MonthTile.FromSheets(measure, sheets)
        where tile is not null
        select new PackedTile(month, measure, MonthTileCodec.Encode(tile));

    /// <summary>All tiles of months of a station that the session's transaction has locked.</summary>
    /// <param name="session">The transaction.</param>
    /// <param name="stationId">The station.</param>
    /// <param name="months">12 x year + month - 1, ascending.</param>
    /// <param name="known">Sheets that need not be read, by date; <c>null</c> where the day is withdrawn.</param>
    /// <param name="ct">Cancels.</param>
    public static async Task<MonthTiles> MakeAsync(
        StoreSession session, int stationId, IReadOnlyList<int> months, IReadOnlyDictionary<int, CellGrid?> known, CancellationToken ct)
    {
        var read = await ReadAsync(session, stationId, months, known, ct);
        var sheets = known.Where(day => day.Value is not null).Select(day => (Date: day.Key, Cells: day.Value!)).Concat(read)
            .ToLookup(day => YearMonth.Of(EpochDay.ToDate(day.Date)).Number, day => day.Cells);
        return new(months, [.. months.SelectMany(month => TilesOf(month, [.. sheets[month]]))]);
    }

    private static async Task<List<(int Date, CellGrid Cells)>> ReadAsync(
        StoreSession session, int stationId, IReadOnlyList<int> months, IReadOnlyDictionary<int, CellGrid?> known, CancellationToken ct)
    {
        int[] dates = [.. months.Select(YearMonth.FromNumber)
            .SelectMany(month => Enumerable.Range(EpochDay.Of(month.FirstDay), month.Days)).Where(date => !known.ContainsKey(date))];
        if (dates.Length == 0)
        {
            return [];
        }

        await using var command = session.Command(
            $"SELECT date, sheet FROM day_sheet WHERE station_id = @station AND sheet IS NOT NULL AND {session.Dialect.InNumbers("date", "@dates")}");
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Numbers("@dates", dates));
        return await command.ListAsync(Sheet, ct);

        (int, CellGrid) Sheet(DbDataReader row) => (row.GetInt32(0), StoredSheets.Decode(stationId, row.GetInt32(0), row.GetFieldValue<byte[]>(1)));
    }
}
