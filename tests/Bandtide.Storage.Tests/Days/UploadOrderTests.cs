using Bandtide.Core.Stations;
using Bandtide.Testing.Databases;
using CsCheck;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Days;

/// <summary>Whatever the way to a state, tiles and days are those of a fresh load of it.</summary>
public sealed class UploadOrderTests
{
    private static readonly DateOnly First = new(2026, 1, 25);

    // Dates over two months, few enough to be hit again; a null sheet withdraws.
    private static readonly Gen<(int Day, int? Sheet)[]> Histories =
        Gen.Select(Gen.Int[0, 13], Gen.Frequency((4, Gen.Int[0, 6].Select(seed => (int?)seed)), (1, Gen.Const((int?)null)))).Array[1, 30];

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Any_history_of_uploads_and_withdrawals_ends_like_a_fresh_load(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var count = 0;
        await Histories.SampleAsync(async history =>
        {
            var number = Interlocked.Increment(ref count);
            var lived = await store.AddStationAsync($"lived-{number}");
            foreach (var (day, sheet) in history)
            {
                await ApplyAsync(store, lived, First.AddDays(day), sheet);
            }

            var state = history.GroupBy(step => step.Day).Select(steps => (steps.Key, steps.Last().Sheet)).Where(day => day.Sheet is not null);
            var fresh = await store.AddStationAsync($"fresh-{number}");
            await store.BulkAsync(fresh, [.. state.Reverse().Select(day => (First.AddDays(day.Key), SampleSheets.Make(day.Sheet!.Value, 3, 0.6)))]);

            Assert.Equal(await store.TilesAsync(fresh), await store.TilesAsync(lived));
            Assert.Equal(await DaysAsync(store, fresh), await DaysAsync(store, lived));
        }, iter: 25, threads: 1);
        await store.AssertSoundAsync();
    }

    private static async Task ApplyAsync(TestStore store, Station station, DateOnly date, int? sheet)
    {
        if (sheet is { } seed)
        {
            await store.PutAsync(station, date, SampleSheets.Make(seed, 3, 0.6));
        }
        else
        {
            await store.Days.WithdrawAsync(station, date, Ct);
        }
    }

    private static async Task<string> DaysAsync(TestStore store, Station station) =>
        string.Join('\n', (await store.Days.ListAsync(station, null, null, Ct)).Select(day => $"{day.Date:O} {day.Checksum} {day.Cells}"));
}
