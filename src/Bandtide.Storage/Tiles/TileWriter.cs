using System.Data.Common;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;
using Bandtide.Storage.Days;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Tiles;

/// <summary>Recomputes month tiles of one station from its sheets, inside a transaction that has locked the station.</summary>
internal sealed class TileWriter(StoreSession session, int stationId)
{
    private static readonly Measure[] Measures = Enum.GetValues<Measure>();

    /// <summary>Replaces all tiles of the months.</summary>
    /// <param name="months">12 x year + month - 1.</param>
    /// <param name="known">Sheets that need not be read, by date; <c>null</c> where the day is withdrawn.</param>
    /// <param name="ct">Cancels.</param>
    public async Task RecomputeAsync(IReadOnlyList<int> months, IReadOnlyDictionary<int, CellGrid?> known, CancellationToken ct)
    {
        var sheets = await SheetsAsync(months, known, ct);
        var tiles = months.SelectMany(month => TilesOf(month, [.. sheets[month]])).ToList();
        await DeleteOthersAsync(months, tiles, ct);
        if (tiles.Count > 0)
        {
            await session.Dialect.WriteTilesAsync(session, stationId, tiles, ct);
        }
    }

    /// <summary>The tiles that a month's sheets give: one for each measure that any of them has.</summary>
    public static IEnumerable<PackedTile> TilesOf(int month, IReadOnlyList<CellGrid> sheets) =>
        from measure in Measures
        let tile = MonthTile.FromSheets(measure, sheets)
        where tile is not null
        select new PackedTile(month, measure, MonthTileCodec.Encode(tile));

    private async Task<ILookup<int, CellGrid>> SheetsAsync(
        IReadOnlyList<int> months, IReadOnlyDictionary<int, CellGrid?> known, CancellationToken ct)
    {
        var unknown = months.Select(YearMonth.FromNumber)
            .SelectMany(month => Enumerable.Range(EpochDay.Of(month.FirstDay), month.Days)).Where(date => !known.ContainsKey(date)).ToList();
        await using var command = session.Command(
            $"SELECT date, sheet FROM day_sheet WHERE station_id = @station AND sheet IS NOT NULL AND {session.Dialect.InNumbers("date", "@dates")}");
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Numbers("@dates", unknown));
        var read = unknown.Count == 0 ? [] : await command.ListAsync(Sheet, ct);
        return known.Where(day => day.Value is not null).Select(day => (Date: day.Key, Cells: day.Value!)).Concat(read)
            .ToLookup(day => YearMonth.Of(EpochDay.ToDate(day.Date)).Number, day => day.Cells);
    }

    private (int Date, CellGrid Cells) Sheet(DbDataReader row) =>
        (row.GetInt32(0), StoredSheets.Decode(stationId, row.GetInt32(0), row.GetFieldValue<byte[]>(1)));

    private async Task DeleteOthersAsync(IReadOnlyList<int> months, List<PackedTile> tiles, CancellationToken ct)
    {
        // Month and measure as one number, so that the list of those that stay is one parameter.
        await using var command = session.Command(
            $"""
            DELETE FROM month_tile WHERE station_id = @station AND {session.Dialect.InNumbers("month", "@months")}
            AND NOT ({session.Dialect.InNumbers("(month * 100 + measure)", "@kept")})
            """);
        command.Add("@station", stationId);
        command.Parameters.Add(session.Dialect.Numbers("@months", [.. months]));
        command.Parameters.Add(session.Dialect.Numbers("@kept", [.. tiles.Select(tile => tile.Month * 100 + (int)tile.Measure)]));
        await command.ExecuteNonQueryAsync(ct);
    }
}
