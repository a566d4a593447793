using Bandtide.Core.Sheets;
using Bandtide.Core.Time;
using Bandtide.Storage.Days;
using Bandtide.Storage.Engine;
using Bandtide.Storage.Network;
using Bandtide.Storage.Tiles;
using Microsoft.EntityFrameworkCore;

namespace Bandtide.Storage.Maintenance;

/// <summary>Work on the store as a whole. All of it may run while the service does.</summary>
public sealed class StoreMaintenance
{
    // One transaction holds a station for about a second at most.
    private const int MonthsPerTransaction = 12;

    private readonly StoreDatabase database;
    private readonly NetworkStore network;
    private readonly StoreOptions options;

    internal StoreMaintenance(StoreDatabase database, NetworkStore network, StoreOptions options) =>
        (this.database, this.network, this.options) = (database, network, options);

    /// <summary>Creates the store or brings it to the current shape. Every start calls it; several may do so at once.</summary>
    public async Task MigrateAsync(CancellationToken ct)
    {
        if (options.Provider is StoreProvider.Sqlite)
        {
            await SqliteFile.PrepareAsync(options.FilePath, ct);
        }

        await using var context = database.CreateContext();
        if ((await context.Database.GetPendingMigrationsAsync(ct)).Any())
        {
            await context.Database.MigrateAsync(ct);
        }
    }

    /// <summary>Whether the store has no station yet.</summary>
    public Task<bool> IsEmptyAsync(CancellationToken ct) => database.ReadAsync(async session =>
    {
        await using var context = await session.ContextAsync(ct);
        return !await context.Stations.AnyAsync(ct);
    }, ct);

    /// <summary>Makes all month tiles anew from the day sheets.</summary>
    /// <exception cref="InvalidDataException">A sheet is damaged; the message names it. Stations before it are done.</exception>
    public async Task RebuildAsync(IProgress<RebuildProgress>? progress, CancellationToken ct)
    {
        var stations = (await network.GetAsync(ct)).Stations;
        var (done, count) = (0, 0);
        foreach (var station in stations.Select(station => station.Id))
        {
            foreach (var months in (await MonthsOfAsync(station, ct)).Chunk(MonthsPerTransaction))
            {
                await database.WriteAsync(async session =>
                {
                    await new DayWriter(session, station).LockAsync([], [], ct);
                    var tiles = await TileMaker.MakeAsync(session, station, months, new Dictionary<int, CellGrid?>(), ct);
                    await session.Dialect.WriteTilesAsync(session, station, tiles, ct);
                    return (months.Length, true);
                }, ct);
                count += months.Length;
            }

            progress?.Report(new(++done, stations.Count, count));
        }
    }

    /// <summary>Reads everything and compares: sheets with their checksums and counts, revisions with each other, tiles with a recomputation.</summary>
    public async Task<VerifyReport> VerifyAsync(CancellationToken ct)
    {
        var view = await network.GetAsync(ct);
        var tally = new VerifyTally();
        foreach (var station in view.Stations)
        {
            await StationVerifier.VerifyAsync(database, station, view.Plan, tally, ct);
        }

        return new(view.Stations.Count, tally.Sheets, tally.Revisions, tally.Tiles, tally.Faults);
    }

    /// <summary>Copies the embedded store as it is at one moment to a new file, which is opened and checked before it gets its name.</summary>
    public async Task<BackupOutcome> BackupAsync(string file, CancellationToken ct) => options.Provider is StoreProvider.Sqlite
        ? await SqliteFile.BackupAsync(database, Path.GetFullPath(file), ct)
        : new BackupOutcome.Refused("Only the embedded store is copied this way; PostgreSQL has pg_dump and pg_basebackup.");

    // Months with sheets, and months with tiles: the latter may have lost their sheets.
    private Task<List<int>> MonthsOfAsync(int station, CancellationToken ct) => database.SnapshotAsync(async session =>
    {
        await using var sheets = session.Command("SELECT date FROM day_sheet WHERE station_id = @station");
        sheets.Add("@station", station);
        await using var tiles = session.Command("SELECT DISTINCT month FROM month_tile WHERE station_id = @station");
        tiles.Add("@station", station);
        var dates = await sheets.ListAsync(row => row.GetInt32(0), ct);
        var months = await tiles.ListAsync(row => row.GetInt32(0), ct);
        return months.Concat(dates.Select(date => YearMonth.Of(EpochDay.ToDate(date)).Number)).Distinct().Order().ToList();
    }, ct);
}
