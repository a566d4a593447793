using System.Buffers;
using Bandtide.Core.Bands;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Bandtide.Server.Demo;

namespace Bandtide.Server.Tests.Demo;

/// <summary>The invented scenario keeps the contract's rules and behaves as short waves do.</summary>
public sealed class DemoSheetsTests
{
    private static readonly DateOnly Last = new(2026, 6, 30);
    private static readonly DemoWeather Weather = new(DemoScenario.FirstDate, Last);

    [Fact]
    public void Sixteen_stations_of_five_continents_report_over_two_years_and_more() =>
        Assert.True(DemoStations.All.Count >= 14 && Last.DayNumber - DemoScenario.FirstDate.DayNumber > 2 * 365);

    [Fact]
    public void A_day_is_the_same_whenever_it_is_made()
    {
        var station = DemoStations.All[0];
        var once = new DemoSheets(station, Weather);
        once.Make(new(2025, 3, 1));
        var sheet = once.Make(new(2025, 6, 1))!;
        var again = new DemoSheets(station, new DemoWeather(new(2025, 5, 1), Last)).Make(new(2025, 6, 1))!;
        Assert.Equal(SheetChecksum.Compute(sheet.Cells, BandPlan.Standard), SheetChecksum.Compute(again.Cells, BandPlan.Standard));
    }

    [Fact]
    public void Every_sheet_keeps_the_contracts_rules()
    {
        var context = new SheetContext(BandPlan.Standard, new DateTimeOffset(2026, 7, 2, 0, 0, 0, TimeSpan.Zero));
        var count = 0;
        foreach (var sheets in DemoStations.All.Select(station => new DemoSheets(station, Weather)))
        {
            for (var date = DemoScenario.FirstDate; date <= Last; date = date.AddDays(37))
            {
                if (sheets.Make(date) is { } sheet)
                {
                    var text = new ArrayBufferWriter<byte>();
                    DaySheetCsv.Write(text, sheet.Cells, BandPlan.Standard);
                    Assert.Empty(DaySheetCsv.Read(text.WrittenSpan, date, context).Problems);
                    count++;
                }
            }
        }

        Assert.True(count > 200);
    }

    // Facts of the trade, common practice, no source: low bands carry far by night, high bands by day.
    [Theory]
    [InlineData("ama-80m", true)]
    [InlineData("bc-49m", true)]
    [InlineData("bc-13m", false)]
    [InlineData("ama-15m", false)]
    public void Low_bands_are_busier_by_night_and_high_bands_by_day(string band, bool byNight)
    {
        // 15 degrees east of Greenwich at most: midnight is near 00 UTC, noon near 12 UTC.
        var european = DemoStations.All.Where(station => Math.Abs(station.Place.LongitudeDegrees) < 16 && station.Place.LatitudeDegrees is > 35 and < 60);
        var (night, day) = (0.0, 0.0);
        foreach (var station in european)
        {
            night += Mean(station, band, 23) + Mean(station, band, 0);
            day += Mean(station, band, 11) + Mean(station, band, 12);
        }

        Assert.Equal(byNight, night > day);
    }

    [Fact]
    public void Copied_days_and_the_silent_station_are_there()
    {
        var copier = DemoStations.All.Single(station => station.Faults.Copies.Count > 0);
        var (copy, source) = copier.Faults.Copies.First();
        var sheets = new DemoSheets(copier, Weather);
        Assert.Equal(
            SheetChecksum.Compute(sheets.Make(source)!.Cells, BandPlan.Standard), SheetChecksum.Compute(sheets.Make(copy)!.Cells, BandPlan.Standard));
        var silent = DemoStations.All.Single(station => station.LastDate < Last);
        Assert.Null(new DemoSheets(silent, Weather).Make(silent.LastDate.AddDays(1)));
    }

    private static double Mean(DemoStation station, string code, int hour)
    {
        Assert.True(BandPlan.Standard.TryGet(code, out var band));
        var sheets = new DemoSheets(station, Weather);
        var values = Enumerable.Range(0, 60).Select(n => sheets.Make(new DateOnly(2025, 9, 1).AddDays(n))).OfType<DaySheet>()
            .Select(sheet => sheet.Cells[Measure.Occupancy.Info().Quantity, hour, sheet.Cells.BandIds.IndexOf(band!.Id)])
            .Where(value => value != CellGrid.Missing).ToList();
        return values.Average();
    }
}
