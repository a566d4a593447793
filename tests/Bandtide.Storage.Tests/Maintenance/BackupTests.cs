using Bandtide.Storage.Maintenance;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Maintenance;

public sealed class BackupTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);

    [Fact]
    public async Task A_copy_made_while_days_arrive_is_a_sound_store_of_one_moment()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Sqlite);
        await using var copy = await TestStore.StartAsync(StoreKind.Sqlite, migrated: false);
        var station = await store.AddStationAsync("north");
        await store.BulkAsync(station, [.. Enumerable.Range(0, 60).Select(i => (June1.AddDays(i), SampleSheets.Make(i)))]);
        using var stop = new CancellationTokenSource();
        var uploads = Task.Run(async () =>
        {
            for (var i = 60; !stop.IsCancellationRequested; i++)
            {
                await store.PutAsync(station, June1.AddDays(i), SampleSheets.Make(i));
            }
        }, Ct);

        var outcome = Assert.IsType<BackupOutcome.Done>(await store.Maintenance.BackupAsync(copy.Options.FilePath, Ct));
        await stop.CancelAsync();
        await uploads;

        Assert.Equal([Path.GetFileName(copy.Options.FilePath)], Directory.GetFiles(copy.Options.DataDirectory).Select(Path.GetFileName));
        Assert.Equal(new FileInfo(copy.Options.FilePath).Length, outcome.Bytes);
        await copy.Maintenance.MigrateAsync(Ct);
        await copy.AssertSoundAsync();
        var days = await copy.Days.ListAsync((await copy.Network.GetAsync(Ct)).FindStation("north")!, null, null, Ct);
        Assert.True(days.Count >= 60, $"{days.Count} days");
        Assert.Equal(Enumerable.Range(0, days.Count).Select(i => June1.AddDays(i)), days.Select(day => day.Date));
    }

    [Fact]
    public async Task An_existing_file_is_not_overwritten()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Sqlite);
        var file = Path.Combine(store.Options.DataDirectory, "precious");
        await File.WriteAllTextAsync(file, "keep me", Ct);

        Assert.IsType<BackupOutcome.Refused>(await store.Maintenance.BackupAsync(file, Ct));

        Assert.Equal("keep me", await File.ReadAllTextAsync(file, Ct));
        Assert.False(File.Exists(file + ".partial"));
    }

    [Fact]
    public async Task PostgreSQL_is_referred_to_its_own_tools()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Postgres);
        var file = Path.Combine(Path.GetTempPath(), Guid.NewGuid().ToString("N"));

        Assert.Contains("pg_dump", Assert.IsType<BackupOutcome.Refused>(await store.Maintenance.BackupAsync(file, Ct)).Reason, StringComparison.Ordinal);
        Assert.False(File.Exists(file));
    }
}
