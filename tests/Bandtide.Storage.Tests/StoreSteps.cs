using Bandtide.Core.Geography;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;
using Bandtide.Storage.Days;
using Bandtide.Storage.Network;
using Bandtide.Testing.Databases;

namespace Bandtide.Storage.Tests;

/// <summary>What most tests do with a store, in one line each.</summary>
internal static class StoreSteps
{
    public static CancellationToken Ct => TestContext.Current.CancellationToken;

    public static async Task<Station> AddStationAsync(
        this TestStore store, string code, GeoPoint? position = null, LevelUnit unit = LevelUnit.DbMilliwatt, params string[] regions) =>
        Assert.IsType<StationCreation.Created>(
            await store.Network.CreateStationAsync(new(code, $"Station {code}", position ?? new(52.5, 13.4), unit, regions), Ct)).Station;

    public static PendingDay Day(DateOnly date, CellGrid cells) => new(new(date, cells), []);

    /// <summary>Stores one day as a <c>PUT</c> does.</summary>
    public static async Task<DayReceipt> PutAsync(this TestStore store, Station station, DateOnly date, CellGrid cells) =>
        Assert.Single(await store.Days.StoreAsync(station, [Day(date, cells)], restoreWithdrawn: true, Ct));

    /// <summary>Stores days as a bulk upload does.</summary>
    public static Task<IReadOnlyList<DayReceipt>> BulkAsync(this TestStore store, Station station, params (DateOnly Date, CellGrid Cells)[] days) =>
        store.Days.StoreAsync(station, [.. days.Select(day => Day(day.Date, day.Cells))], restoreWithdrawn: false, Ct);

    /// <summary>Nothing is wrong in the store.</summary>
    public static async Task AssertSoundAsync(this TestStore store) => Assert.Empty((await store.Maintenance.VerifyAsync(Ct)).Faults);

    /// <summary>All tiles of a station, month and measure by measure, as text for comparing.</summary>
    public static async Task<string> TilesAsync(this TestStore store, Station station)
    {
        await using var context = store.CreateContext();
        var connection = Microsoft.EntityFrameworkCore.RelationalDatabaseFacadeExtensions.GetDbConnection(context.Database);
        await connection.OpenAsync(Ct);
        await using var command = connection.CreateCommand();
        command.CommandText = $"SELECT month, measure, tile FROM month_tile WHERE station_id = {station.Id} ORDER BY month, measure";
        await using var reader = await command.ExecuteReaderAsync(Ct);
        var lines = new List<string>();
        while (await reader.ReadAsync(Ct))
        {
            lines.Add($"{reader.GetInt32(0)} {reader.GetInt32(1)} {Convert.ToHexString(reader.GetFieldValue<byte[]>(2))}");
        }

        return string.Join('\n', lines);
    }

    /// <summary>Every cell of two grids is equal.</summary>
    public static void AssertSameCells(CellGrid expected, CellGrid? actual)
    {
        Assert.NotNull(actual);
        Assert.Equal(expected.BandIds, actual.BandIds);
        foreach (var quantity in Enum.GetValues<Quantity>())
        {
            Assert.Equal(expected.Plane(quantity), actual.Plane(quantity));
        }
    }
}
