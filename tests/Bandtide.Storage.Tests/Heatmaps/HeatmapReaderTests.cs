using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Heatmaps;
using Bandtide.Testing.Databases;
using static Bandtide.Storage.Tests.StoreSteps;

namespace Bandtide.Storage.Tests.Heatmaps;

public sealed class HeatmapReaderTests
{
    private static readonly DateOnly June1 = new(2026, 6, 1);
    private static readonly Period June = new Period.Months(new(2026, 6), new(2026, 6));

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Unknown_codes_are_unknown_selections(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);

        Assert.IsType<HeatmapOutcome.UnknownSelection>(await store.Heatmaps.ReadAsync(new("nobody", null, June), Ct));
        Assert.IsType<HeatmapOutcome.UnknownSelection>(await store.Heatmaps.ReadAsync(new(null, "field-jo", June), Ct));
        Assert.Null(await store.Heatmaps.RevisionAsync(new(null, "nowhere", June), Ct));
        Assert.NotNull(await store.Heatmaps.RevisionAsync(new(null, "all", June), Ct));
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_selection_without_data_has_no_bands_and_says_why(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        Assert.Equal("There is no station in this region.", (await AnswerAsync(store, new(null, "all", June))).Note);

        var north = await store.AddStationAsync("north");
        await store.AddStationAsync("south", new(-35, 20));
        Assert.Contains("Nobody in the network", (await AnswerAsync(store, new("south", null, June))).Note, StringComparison.Ordinal);

        await store.PutAsync(north, June1, SampleSheets.Make(1, signal: false));
        foreach (var interval in Enum.GetValues<IntervalChoice>())
        {
            var silent = await AnswerAsync(store, new("south", null, June) { Interval = interval });
            Assert.Empty(silent.Heatmap.Bands);
            Assert.Empty(silent.Stations);
            Assert.Equal("This station did not report \"Occupancy\" in this layer for this period.", silent.Note);
            Assert.Contains("\"Signal\"", (await AnswerAsync(store, new("north", null, June) { Measure = Measure.Signal, Interval = interval })).Note, StringComparison.Ordinal);
            Assert.Contains("layer", (await AnswerAsync(store, new(null, "all", June) { Layer = BandLayer.Slice, Interval = interval })).Note, StringComparison.Ordinal);
        }
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Few_stations_few_days_and_the_tropics_are_noted(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var tropical = await store.AddStationAsync("tropical", new(-15, 30));
        await store.PutAsync(tropical, June1, SampleSheets.Make(1));

        var note = (await AnswerAsync(store, new(null, "all", June))).Note;
        Assert.Contains("fewer than three stations", note, StringComparison.Ordinal);
        Assert.Contains("Few data", note, StringComparison.Ordinal);
        Assert.Contains("fewer than three squares", (await AnswerAsync(store, new(null, "all", June) { Vote = VoteUnit.Square })).Note, StringComparison.Ordinal);

        await store.BulkAsync(tropical, [.. Enumerable.Range(1, 9).Select(i => (June1.AddDays(i), SampleSheets.Make(i)))]);
        Assert.Null((await AnswerAsync(store, new("tropical", null, June))).Note);

        // At 15 degrees the season is meaningless still; 15.1 it is not.
        var winter = new HeatmapQuery("tropical", null, new Period.SeasonOf(Season.Winter, 2026, 2026));
        Assert.Contains("equator: tropical", (await AnswerAsync(store, winter)).Note, StringComparison.Ordinal);
        Assert.Equal(10, (await AnswerAsync(store, winter)).StationDays);
        Assert.Null((await AnswerAsync(store, winter with { Period = new Period.SeasonOf(Season.Summer, 2026, 2026), Alignment = SeasonAlignment.Calendar })).Note);
        var beyond = await store.AddStationAsync("beyond", new(15.1, 30));
        await store.BulkAsync(beyond, [.. Enumerable.Range(0, 9).Select(i => (June1.AddDays(i), SampleSheets.Make(i)))]);
        Assert.Null((await AnswerAsync(store, new("beyond", null, new Period.SeasonOf(Season.Summer, 2026, 2026)))).Note);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Levels_of_different_units_are_refused_only_where_they_would_be_pooled(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var north = await store.AddStationAsync("north");
        var south = await store.AddStationAsync("south", new(-35, 20), LevelUnit.DbMicrovolt);
        await store.PutAsync(north, June1, SampleSheets.Make(1));
        var level = new HeatmapQuery(null, "all", June) { Measure = Measure.Level };
        Assert.Equal("dBm", (await AnswerAsync(store, level)).Unit);

        await store.PutAsync(south, June1, SampleSheets.Make(2));

        foreach (var interval in Enum.GetValues<IntervalChoice>())
        {
            var refused = Assert.IsType<HeatmapOutcome.Refused>(await store.Heatmaps.ReadAsync(level with { Interval = interval }, Ct));
            Assert.Contains("dBm", refused.Message, StringComparison.Ordinal);
            Assert.Contains("dBuV", refused.Message, StringComparison.Ordinal);
            Assert.Equal("dB", (await AnswerAsync(store, level with { Measure = Measure.Excess, Interval = interval })).Unit);
            Assert.Equal("1", (await AnswerAsync(store, level with { Measure = Measure.Occupancy, Interval = interval })).Unit);
        }
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Differing_setups_are_answered_with_a_caution_from_their_entry_on(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var stations = new[] { await store.AddStationAsync("north"), await store.AddStationAsync("south", new(-35, 20)) };
        foreach (var station in stations)
        {
            await store.PutAsync(station, June1, SampleSheets.Make(station.Id));
        }

        await store.Network.AddSetupAsync(stations[0], new(June1, Detector: Detector.Power), Ct);
        var before = await AnswerAsync(store, new(null, "all", June));
        Assert.Null(before.NotComparable);
        await store.Network.AddSetupAsync(stations[1], new(June1, Detector: Detector.Peak), Ct);
        var after = await AnswerAsync(store, new(null, "all", June));

        Assert.Contains("detector", after.NotComparable, StringComparison.Ordinal);
        Assert.NotEqual(before.Revision, after.Revision);
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task A_reader_never_misses_an_upload_that_was_acknowledged(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var second = store.OpenAgain();
        var station = await store.AddStationAsync("north");
        for (var i = 0; i < 12; i++)
        {
            await store.PutAsync(station, June1.AddDays(i), SampleSheets.Make(i));
            foreach (var reader in new[] { store, second })
            {
                foreach (var interval in Enum.GetValues<IntervalChoice>())
                {
                    Assert.Equal(i + 1, (await AnswerAsync(reader, new("north", null, June) { Interval = interval })).StationDays);
                }
            }
        }
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task The_revision_moves_exactly_when_the_answer_could(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        await using var second = store.OpenAgain();
        var station = await store.AddStationAsync("north");
        var month = new HeatmapQuery("north", null, June);
        var summers = new HeatmapQuery(null, "all", new Period.SeasonOf(Season.Summer, null, null));
        var revisions = new List<string?>();

        async Task MovesAsync(bool monthMoves, bool summersMove)
        {
            var (m, s) = (await store.Heatmaps.RevisionAsync(month, Ct), await store.Heatmaps.RevisionAsync(summers, Ct));
            Assert.Equal(m, await second.Heatmaps.RevisionAsync(month, Ct));
            Assert.Equal(m, (await AnswerAsync(store, month)).Revision);
            Assert.Equal(m, (await AnswerAsync(second, month with { Interval = IntervalChoice.None })).Revision);
            if (revisions.Count > 0)
            {
                Assert.Equal(monthMoves, !string.Equals(revisions[^2], m, StringComparison.Ordinal));
                Assert.Equal(summersMove, !string.Equals(revisions[^1], s, StringComparison.Ordinal));
            }

            revisions.AddRange([m, s]);
        }

        await MovesAsync(true, true);
        await store.PutAsync(station, June1, SampleSheets.Make(1));
        await MovesAsync(true, true);
        await store.PutAsync(station, June1, SampleSheets.Make(1));
        await MovesAsync(false, false);
        await store.PutAsync(station, new(2026, 7, 1), SampleSheets.Make(1));
        await MovesAsync(false, true);
        await store.PutAsync(station, new(2026, 1, 1), SampleSheets.Make(1));
        await MovesAsync(false, false);
        await store.PutAsync(station, June1, SampleSheets.Make(2));
        await MovesAsync(true, true);
        await store.Keys.IssueAsync(station.Id, "a key", Ct);
        await MovesAsync(false, false);
        await store.Days.WithdrawAsync(station, June1, Ct);
        await MovesAsync(true, true);
        await store.Days.WithdrawAsync(station, June1, Ct);
        await MovesAsync(false, false);
        await store.Network.AddSetupAsync(station, new(June1), Ct);
        await MovesAsync(true, true);

        // No state ever gets back a revision it had.
        Assert.Equal(5, revisions.Where((_, i) => i % 2 == 0).Distinct(StringComparer.Ordinal).Count());
        Assert.Equal(6, revisions.Where((_, i) => i % 2 == 1).Distinct(StringComparer.Ordinal).Count());
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Tiles_are_read_once_per_change_and_a_damaged_one_is_named(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var station = await store.AddStationAsync("north");
        await store.PutAsync(station, June1, SampleSheets.Make(1));
        var query = new HeatmapQuery("north", null, June) { Interval = IntervalChoice.None };
        var before = await AnswerAsync(store, query);

        await store.SqlAsync("UPDATE month_tile SET tile = (SELECT hash FROM access_key UNION ALL SELECT checksum FROM day_sheet LIMIT 1)");
        Assert.Equal(before.Heatmap.Cells.ToArray(), (await AnswerAsync(store, query)).Heatmap.Cells.ToArray());

        await store.SqlAsync("UPDATE month_change SET counter = counter + 1 WHERE month > 0");
        var failure = await Assert.ThrowsAsync<InvalidDataException>(() => store.Heatmaps.ReadAsync(query, Ct));
        Assert.Contains("2026-06", failure.Message, StringComparison.Ordinal);

        await store.Maintenance.RebuildAsync(null, Ct);
        Assert.Equal(before.Heatmap.Cells.ToArray(), (await AnswerAsync(store, query)).Heatmap.Cells.ToArray());
    }

    [Theory, MemberData(nameof(Stores.Each), MemberType = typeof(Stores))]
    public async Task Readers_beside_writers_see_whole_states_only(StoreKind kind)
    {
        await using var store = await TestStore.StartAsync(kind);
        var stations = new[] { await store.AddStationAsync("north"), await store.AddStationAsync("south", new(-35, 20)) };

        // Each upload gives a station one and the same sheet on all its days, so that any mixture would show in the spread.
        var writers = stations.Select(station => Task.Run(async () =>
        {
            for (var i = 0; i < 15; i++)
            {
                await store.BulkAsync(station, [.. Enumerable.Range(0, 5).Select(day => (June1.AddDays(day), SampleSheets.Make(i)))]);
            }
        }, Ct)).ToList();
        var query = new HeatmapQuery("north", null, June) { Statistic = Statistic.Sd };
        while (!Task.WhenAll(writers).IsCompleted)
        {
            Assert.All((await AnswerAsync(store, query)).Heatmap.Cells.ToArray(), cell => Assert.Equal(0, cell.Value, 1e-9));

            await AnswerAsync(store, new(null, "all", June) { Interval = IntervalChoice.None });
        }

        await Task.WhenAll(writers);
        await store.AssertSoundAsync();
    }

    private static async Task<HeatmapAnswer> AnswerAsync(TestStore store, HeatmapQuery query) =>
        Assert.IsType<HeatmapOutcome.Answered>(await store.Heatmaps.ReadAsync(query, Ct)).Answer;
}
