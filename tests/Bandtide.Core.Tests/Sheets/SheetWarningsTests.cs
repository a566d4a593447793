using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Sheets;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Tests.Sheets;

public sealed class SheetWarningsTests
{
    private static readonly Setup Since2026 = new(new(2026, 1, 1), MarginDb: 5);

    [Fact]
    public void A_plausible_day_under_a_setup_gives_no_warning() =>
        Assert.Empty(Find("3,bc-49m,720,0.4,-70,-95,-80,-98", Station(Since2026)));

    [Fact]
    public void Signal_below_level_is_counted_with_the_first_cell_by_hour()
    {
        var warning = Assert.Single(Find("7,bc-49m,720,0.8,-91,-90,-80,-98\n5,bc-41m,720,0.8,-90.01,-90,-80,-98\n4,bc-41m,720,0.8,-90,-90,-80,-98", Station(Since2026)));
        Assert.Equal((SheetRule.SignalBelowLevel, 2, 5, "bc-41m"), (warning.Rule, warning.Count, warning.Hour, warning.Band));
    }

    [Theory]
    [InlineData("-92.99", "0.4999", true)]
    [InlineData("-93.00", "0.4999", false)]
    [InlineData("-92.99", "0.5", false)]
    public void Level_above_the_threshold_needs_half_occupancy(string level, string occupancy, bool warned)
    {
        var found = Find($"0,bc-49m,720,{occupancy},,{level},,-98", Station(Since2026));
        Assert.Equal(warned ? SheetRule.LevelAboveThreshold : "", string.Concat(found.Select(warning => warning.Rule)));
    }

    [Fact]
    public void The_margin_is_that_of_the_setup_in_effect()
    {
        var station = Station(Since2026, new(new(2026, 3, 1), MarginDb: 10), new(new(2026, 9, 1), MarginDb: 3));
        Assert.Empty(Find("0,bc-49m,720,0.1,,-88.00,,-98", station));
        Assert.Contains("floor + 10 dB", Assert.Single(Find("0,bc-49m,720,0.1,,-87.99,,-98", station)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Without_a_margin_it_is_five_decibels_and_said_so()
    {
        var station = Station(new Setup(new(2026, 1, 1)));
        Assert.Empty(Find("0,bc-49m,720,0.1,,-93.00,,-98", station));
        Assert.Contains("5 dB, no margin being told", Assert.Single(Find("0,bc-49m,720,0.1,,-92.99,,-98", station)).Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_station_without_a_setup_is_told()
    {
        var warning = Assert.Single(Find("0,bc-49m,720,0.4,,,,", Station()));
        Assert.Equal((SheetRule.NoSetup, 1, null, null), (warning.Rule, warning.Count, warning.Hour, warning.Band));
    }

    [Theory]
    [InlineData("2026-06-02", SheetRule.BeforeFirstSetup)]
    [InlineData("2026-06-01", "")]
    public void A_date_before_the_first_setup_is_told(string validFrom, string rule)
    {
        var first = DateOnly.ParseExact(validFrom, "yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture);
        var found = Find("0,bc-49m,720,0.4,,,,", Station(new Setup(first)));
        Assert.Equal(rule, string.Concat(found.Select(warning => warning.Rule)));
        Assert.All(found, warning => Assert.Contains(validFrom, warning.Message, StringComparison.Ordinal));
    }

    [Fact]
    public void A_copy_names_the_day_that_it_equals()
    {
        var warning = Assert.Single(Find("0,bc-49m,720,0.4,,,,", Station(Since2026), new(2026, 5, 30)));
        Assert.Equal(SheetRule.CopiedDay, warning.Rule);
        Assert.Contains("2026-05-30", warning.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Every_rule_gives_one_entry_in_a_fixed_order()
    {
        var rows = string.Join('\n', Enumerable.Range(0, 24).Select(hour => $"{hour},bc-49m,720,0.1,-80,-70,,-98"));
        var found = Find(rows, Station(), new(2026, 5, 30));
        Assert.Equal([SheetRule.SignalBelowLevel, SheetRule.LevelAboveThreshold, SheetRule.NoSetup, SheetRule.CopiedDay], found.Select(warning => warning.Rule));
        Assert.Equal([24, 24, 1, 1], found.Select(warning => warning.Count));
    }

    private static Station Station(params Setup[] setups) =>
        new(1, "ko33", "Test", new GeoPoint(53.5, 27.5), LevelUnit.DbMilliwatt, 1, setups);

    private static IReadOnlyList<SheetWarning> Find(string rows, Station station, DateOnly? copiedFrom = null)
    {
        var body = Encoding.UTF8.GetBytes("hour,band,sweeps,occupancy,signal,level,level_p90,floor\n" + rows);
        var reading = DaySheetCsv.Read(body, SheetSamples.Date, SheetSamples.Context);
        Assert.Empty(reading.Problems);
        return SheetWarnings.Find(reading.Sheet!, station, BandPlan.Standard, copiedFrom);
    }
}
