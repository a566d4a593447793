using Microsoft.EntityFrameworkCore.Migrations;

namespace Bandtide.Migrations.Postgres;

/// <summary>How PostgreSQL keeps the packed columns; part of the first migration.</summary>
internal static class StorageTuning
{
    /// <summary>Sets storage and vacuum parameters of the large tables.</summary>
    public static void Apply(MigrationBuilder migrationBuilder) => migrationBuilder.Sql(
        """
        -- Packed bytes do not compress again, and a row is read fastest where it stands: nothing moves to a side table
        -- as long as the row fits on a page.
        ALTER TABLE day_sheet ALTER COLUMN sheet SET STORAGE EXTERNAL;
        ALTER TABLE day_sheet SET (toast_tuple_target = 8160);
        ALTER TABLE day_revision ALTER COLUMN sheet SET STORAGE EXTERNAL;
        ALTER TABLE day_revision SET (toast_tuple_target = 8160);
        ALTER TABLE month_tile ALTER COLUMN tile SET STORAGE EXTERNAL;
        ALTER TABLE month_tile SET (toast_tuple_target = 8160);

        -- The current month's tiles are rewritten with every day that arrives: dead rows are to be swept up while they
        -- are few. A counter is one short row rewritten all the time, with room for its next versions on its page.
        ALTER TABLE day_sheet SET (autovacuum_vacuum_scale_factor = 0.02, autovacuum_vacuum_insert_scale_factor = 0.1);
        ALTER TABLE month_tile SET (autovacuum_vacuum_scale_factor = 0.02, autovacuum_vacuum_threshold = 200);
        ALTER TABLE month_change SET (fillfactor = 10, autovacuum_vacuum_scale_factor = 0, autovacuum_vacuum_threshold = 1000);
        """);
}
