using Bandtide.Storage.Model;
using Bandtide.Testing.Databases;
using Microsoft.EntityFrameworkCore;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Maintenance;

public sealed class MigrationTests
{
    private static readonly string[] LargeTables = ["day_sheet", "day_revision", "month_tile"];

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_model_and_its_migrations_agree(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var context = store.CreateContext();

        Assert.False(context.Database.HasPendingModelChanges());
        Assert.Empty(await context.Database.GetPendingMigrationsAsync(Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Migrating_may_be_repeated_and_done_by_several_at_once(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind, migrated: false);
        await using var second = store.OpenAgain();

        await Task.WhenAll(new[] { store, second }.Select(instance => Task.Run(() => instance.Maintenance.MigrateAsync(Ct), Ct)));
        await store.Maintenance.MigrateAsync(Ct);

        Assert.True(await store.Maintenance.IsEmptyAsync(Ct));
        await store.AddStationAsync("north");
        Assert.False(await store.Maintenance.IsEmptyAsync(Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Every_primary_key_of_a_large_table_begins_with_the_station(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var context = store.CreateContext();

        var tables = context.Model.GetEntityTypes().Where(type => LargeTables.Contains(type.GetTableName())).ToList();

        Assert.Equal(3, tables.Count);
        Assert.All(tables, table => Assert.Equal(nameof(DaySheetRow.StationId), table.FindPrimaryKey()!.Properties[0].Name));
    }

    [Fact]
    public async Task A_start_killed_while_it_migrated_does_not_hold_up_the_next()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Sqlite, migrated: false);
        await store.SqlAsync(
            "CREATE TABLE __EFMigrationsLock (Id INTEGER NOT NULL PRIMARY KEY, Timestamp TEXT NOT NULL); " +
            "INSERT INTO __EFMigrationsLock VALUES (1, '2026-01-01 00:00:00+00:00')");

        await store.Maintenance.MigrateAsync(Ct).WaitAsync(TimeSpan.FromSeconds(20), Ct);

        Assert.True(await store.Maintenance.IsEmptyAsync(Ct));
    }

    [Fact]
    public async Task The_embedded_store_is_durable_and_in_write_ahead_mode()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Sqlite, migrated: false);
        await store.Maintenance.MigrateAsync(Ct);

        Assert.Equal("wal", await store.SqlAsync("PRAGMA journal_mode"));

        // The dialect's own connections, which do all the writing.
        var dialect = new Bandtide.Storage.Engine.SqliteDialect(store.Options.FilePath);
        await using (var connection = await dialect.OpenAsync(Ct))
        {
            await using var command = connection.CreateCommand();
            command.CommandText = "SELECT (SELECT synchronous FROM pragma_synchronous), (SELECT foreign_keys FROM pragma_foreign_keys)";
            await using var reader = await command.ExecuteReaderAsync(Ct);
            await reader.ReadAsync(Ct);
            Assert.Equal((2, 1), (reader.GetInt32(0), reader.GetInt32(1)));
        }

        dialect.Dispose();
    }
}
