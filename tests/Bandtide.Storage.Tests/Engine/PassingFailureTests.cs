using Bandtide.Storage.Days;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Engine;

public sealed class PassingFailureTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);

    [Fact]
    public async Task Work_is_done_again_when_PostgreSQL_dropped_its_connections()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Postgres);
        var station = await store.AddStationAsync("north");
        for (var i = 0; i < 5; i++)
        {
            await CutAsync(store, 0);

            Assert.Equal(DayStatus.Created, (await store.PutAsync(station, June1.AddDays(i), SampleSheets.Make(i))).Status);
        }

        await store.AssertSoundAsync();
    }

    [Fact]
    public async Task Connections_cut_in_the_middle_of_uploads_lose_nothing_that_was_acknowledged()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Postgres);
        var station = await store.AddStationAsync("north");
        var acknowledged = new List<DateOnly>();
        for (var i = 0; i < 60; i++)
        {
            // The cut comes somewhere in the upload; later each time.
            var cut = i % 2 == 0 ? Task.Run(() => CutAsync(store, i), Ct) : Task.CompletedTask;
            acknowledged.Add((await store.PutAsync(station, June1.AddDays(i), SampleSheets.Make(i))).Date);
            await cut;
        }

        Assert.Equal(acknowledged, (await store.Days.ListAsync(station, null, null, Ct)).Select(day => day.Date));
        await store.AssertSoundAsync();
    }

    [Fact]
    public async Task A_writer_in_another_process_is_waited_for()
    {
        await using var store = await TestStore.StartAsync(StoreKind.Sqlite);
        var station = await store.AddStationAsync("north");
        await using var context = store.CreateContext();
        var other = Microsoft.EntityFrameworkCore.RelationalDatabaseFacadeExtensions.GetDbConnection(context.Database);
        await other.OpenAsync(Ct);
        await using var transaction = await other.BeginTransactionAsync(Ct);

        var upload = Task.Run(() => store.PutAsync(station, June1, SampleSheets.Make(1)), Ct);
        await Task.Delay(300, Ct);
        Assert.False(upload.IsCompleted);
        await transaction.RollbackAsync(Ct);

        Assert.Equal(DayStatus.Created, (await upload).Status);
    }

    private static async Task CutAsync(TestStore store, int afterHundredMicroseconds)
    {
        await Task.Delay(TimeSpan.FromMicroseconds(100 * afterHundredMicroseconds), Ct);
        await store.SqlAsync("SELECT count(pg_terminate_backend(pid)) FROM pg_stat_activity WHERE datname = current_database() AND pid <> pg_backend_pid()");
    }
}
