using System.Globalization;
using Bandtide.Core.Stations;
using Bandtide.Storage.Days;
using Bandtide.Storage.Keys;
using Bandtide.Storage.Maintenance;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Demo;

/// <summary>Fills an empty store with the invented scenario up to yesterday.</summary>
/// <remarks>
/// The marking region is drawn up before any day is stored, so that an interrupted load is told from a store of measured
/// data and completed at the next start; a later start adds the days since. Days that are there are left as they are.
/// </remarks>
internal sealed class DemoLoader(
    NetworkStore network, DayStore days, KeyStore keys, StoreMaintenance maintenance, TimeProvider clock, TextWriter output)
{
    private const int DaysAtOnce = 366;

    /// <summary>Loads what is missing; a store with other stations is left alone.</summary>
    public async Task LoadAsync(CancellationToken ct)
    {
        var isEmpty = await maintenance.IsEmptyAsync(ct);
        if (!isEmpty && (await network.GetAsync(ct)).FindRegion(DemoScenario.Region) is null
            && (await network.GetAsync(ct)).Stations.Any(station => DemoStations.All.All(demo => !IsSame(demo, station))))
        {
            await output.WriteLineAsync("The store holds stations already: the demonstration is not loaded.");
            return;
        }

        var started = clock.GetTimestamp();
        var stations = await RegisterAsync(ct);
        var yesterday = DateOnly.FromDateTime(clock.GetUtcNow().UtcDateTime).AddDays(-1);
        var weather = new DemoWeather(DemoScenario.FirstDate, yesterday);
        var done = 0;
        var options = new ParallelOptions { MaxDegreeOfParallelism = Math.Max(2, Environment.ProcessorCount), CancellationToken = ct };
        await Parallel.ForEachAsync(stations, options, async (pair, token) =>
        {
            var added = await FillAsync(pair.Demo, pair.Station, weather, yesterday, token);
            var count = Interlocked.Increment(ref done);
            await output.WriteLineAsync(string.Create(
                CultureInfo.InvariantCulture,
                $"Demonstration data, invented: {100 * count / stations.Count,3} %, {count} of {stations.Count} stations, {pair.Demo.Code} {added} days, {clock.GetElapsedTime(started).TotalSeconds:0.0} s"));
        });
        await keys.EnsureAsync(DemoScenario.Key, stations.Single(pair => string.Equals(pair.Demo.Code, DemoScenario.KeyStation, StringComparison.Ordinal)).Station.Id, loopbackOnly: true, "demonstration", ct);
        await output.WriteLineAsync($"Key of the station {DemoScenario.KeyStation}, good from this machine alone: {DemoScenario.Key}");
    }

    private static bool IsSame(DemoStation demo, Station station) => string.Equals(demo.Code, station.Code, StringComparison.Ordinal);

    private async Task<IReadOnlyList<(DemoStation Demo, Station Station)>> RegisterAsync(CancellationToken ct)
    {
        foreach (var demo in DemoStations.All)
        {
            await network.CreateStationAsync(new(demo.Code, demo.Name, demo.Place, demo.Unit, []), ct);
            var station = (await network.GetAsync(ct)).FindStation(demo.Code)!;
            foreach (var setup in demo.Setups.Where(setup => station.Setups.All(known => known.ValidFrom != setup.ValidFrom)))
            {
                await network.AddSetupAsync(station, setup, ct);
            }
        }

        await network.CreateRegionAsync(new(DemoScenario.Region, "Demonstration (invented)", [.. DemoStations.All.Select(demo => demo.Code)], null), ct);
        foreach (var (code, name, members) in DemoScenario.Lists)
        {
            await network.CreateRegionAsync(new(code, name, members, null), ct);
        }

        var view = await network.GetAsync(ct);
        return [.. DemoStations.All.Select(demo => (demo, view.FindStation(demo.Code)!))];
    }

    private async Task<int> FillAsync(DemoStation demo, Station station, DemoWeather weather, DateOnly last, CancellationToken ct)
    {
        var present = (await days.ListAsync(station, null, null, ct)).Select(day => day.Date).ToHashSet();
        var sheets = new DemoSheets(demo, weather);
        var missing = Enumerable.Range(0, last.DayNumber - DemoScenario.FirstDate.DayNumber + 1)
            .Select(DemoScenario.FirstDate.AddDays).Where(date => !present.Contains(date));
        var count = 0;
        foreach (var batch in missing.Select(sheets.Make).OfType<Core.Sheets.DaySheet>().Chunk(DaysAtOnce))
        {
            await days.StoreAsync(station, [.. batch.Select(sheet => new PendingDay(sheet, []))], restoreWithdrawn: false, ct);
            count += batch.Length;
        }

        return count;
    }
}
