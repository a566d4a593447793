namespace Bandtide.Storage.Engine;

/// <summary>Statements of an upload whose text is the same for both providers but for lists.</summary>
internal static class DaySql
{
    /// <summary>Moves what stands at <c>@superseded</c> among the earlier revisions; its place is written anew afterwards.</summary>
    public static string KeepSuperseded(IStoreDialect dialect) =>
        $"""
        INSERT INTO day_revision (station_id, date, revision, received_at, cell_count, hours_mask, band_count, checksum, sheet)
        SELECT station_id, date, revision, received_at, cell_count, hours_mask, band_count, checksum, sheet
        FROM day_sheet WHERE station_id = @station AND {dialect.InNumbers("date", "@superseded")}
        """;

    /// <summary>Deletes the tiles of <c>@months</c> that are not among <c>@kept</c>.</summary>
    public static string DeleteOtherTiles(IStoreDialect dialect) =>
        $"""
        DELETE FROM month_tile WHERE station_id = @station AND {dialect.InNumbers("month", "@months")}
        AND NOT ({dialect.InNumbers("(month * 100 + measure)", "@kept")})
        """;
}
