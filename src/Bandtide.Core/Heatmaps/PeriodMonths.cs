using Bandtide.Core.Time;

namespace Bandtide.Core.Heatmaps;

/// <summary>Turns a period into months.</summary>
public static class PeriodMonths
{
    /// <summary>The months of a period for a station, ascending.</summary>
    /// <param name="period">The period.</param>
    /// <param name="hemisphere">The station's.</param>
    /// <param name="alignment">Whether seasons follow the station's hemisphere or the north's.</param>
    /// <param name="first">First month that could hold data.</param>
    /// <param name="last">Last month that could hold data.</param>
    public static IReadOnlyList<YearMonth> For(
        Period period, Hemisphere hemisphere, SeasonAlignment alignment, YearMonth first, YearMonth last)
    {
        switch (period)
        {
            case Period.Months months:
                var from = months.From.Number < first.Number ? first : months.From;
                var to = months.To.Number > last.Number ? last : months.To;
                return from.Number > to.Number ? [] : [.. YearMonth.Range(from, to)];
            case Period.SeasonOf season:
                var followed = alignment == SeasonAlignment.Calendar ? Hemisphere.North : hemisphere;
                var firstYear = Math.Max(season.FromYear ?? first.Year, first.Year);
                var lastYear = Math.Min(season.ToYear ?? (last.Year + 1), last.Year + 1);
                return
                [
                    .. Enumerable.Range(firstYear, Math.Max(0, lastYear - firstYear + 1))
                        .SelectMany(year => Seasons.Months(season.Season, year, followed))
                        .Where(month => month.Number >= first.Number && month.Number <= last.Number),
                ];
            default:
                throw new ArgumentOutOfRangeException(nameof(period));
        }
    }
}
