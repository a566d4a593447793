using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Heatmaps;

public sealed class PeriodMonthsTests
{
    private static readonly Gen<(YearMonth First, YearMonth Last)> Available = Gen.Select(Gen.Int[1995, 2005], Gen.Int[1, 12], Gen.Int[0, 100])
        .Select((year, month, more) => (new YearMonth(year, month), new YearMonth(year, month).AddMonths(more)));

    [Fact]
    public void A_range_of_months_is_cut_to_what_can_hold_data() => Gen.Select(Available, Available).Sample((asked, available) =>
    {
        var months = For(new Period.Months(asked.First, asked.Last), Hemisphere.North, SeasonAlignment.Local, available);
        var expected = Enumerable.Range(0, 20_000).Select(number => 12 * 1900 + number)
            .Where(number => number >= asked.First.Number && number <= asked.Last.Number && number >= available.First.Number && number <= available.Last.Number);
        Assert.Equal(expected, months.Select(month => month.Number));
    });

    // By calendar: the winter of the north and the summer of the south are December to February, in January's year.
    [Fact]
    public void A_season_is_the_months_of_its_hemisphere_and_years() => Gen.Select(
        Available, Gen.Enum<Season>(), Gen.Enum<Hemisphere>(), Gen.Enum<SeasonAlignment>(), Gen.Bool, Gen.Int[1990, 2015], Gen.Int[0, 10]).Sample(
        (available, season, hemisphere, alignment, allYears, first, more) =>
        {
            var period = new Period.SeasonOf(season, allYears ? null : first, allYears ? null : first + more);
            var south = hemisphere == Hemisphere.South && alignment == SeasonAlignment.Local;
            int[] calendar = (season, south) switch
            {
                (Season.Winter, false) or (Season.Summer, true) => [12, 1, 2],
                (Season.Spring, false) or (Season.Autumn, true) => [3, 4, 5],
                (Season.Summer, false) or (Season.Winter, true) => [6, 7, 8],
                _ => [9, 10, 11],
            };
            var expected = from year in Enumerable.Range(1990, 40)
                           from month in Enumerable.Range(1, 12)
                           let seasonYear = month == 12 ? year + 1 : year
                           where calendar.Contains(month) && (allYears || (seasonYear >= first && seasonYear <= first + more))
                           let number = new YearMonth(year, month)
                           where number >= available.First && number <= available.Last
                           select number;
            Assert.Equal(expected, For(period, hemisphere, alignment, available));
        });

    private static IReadOnlyList<YearMonth> For(Period period, Hemisphere hemisphere, SeasonAlignment alignment, (YearMonth First, YearMonth Last) available) =>
        PeriodMonths.For(period, hemisphere, alignment, available.First, available.Last);
}
