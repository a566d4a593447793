using System.Globalization;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Time;

public sealed class YearMonthTests
{
    [Fact]
    public void Number_and_text_lead_back_to_the_month() =>
        Gen.Select(Gen.Int[1950, 9998], Gen.Int[1, 12]).Sample((year, month) =>
        {
            var original = new YearMonth(year, month);
            return YearMonth.FromNumber(original.Number) == original
                && YearMonth.Parse(original.ToString()) == original
                && (original.Year, original.Month) == (year, month)
                && original.Number == 12 * year + month - 1;
        });

    [Fact]
    public void Text_is_that_of_the_base_library() =>
        Samples.Month.Sample(month => Assert.Equal(month.FirstDay.ToString("yyyy-MM", CultureInfo.InvariantCulture), month.ToString()));

    [Fact]
    public void First_and_last_day_enclose_exactly_the_dates_of_the_month() =>
        Samples.Month.Sample(month =>
            YearMonth.Of(month.FirstDay) == month && YearMonth.Of(month.LastDay) == month
            && YearMonth.Of(month.FirstDay.AddDays(-1)) == month.AddMonths(-1)
            && YearMonth.Of(month.LastDay.AddDays(1)) == month.AddMonths(1)
            && month.LastDay.DayNumber - month.FirstDay.DayNumber + 1 == month.Days);

    [Fact]
    public void Order_is_that_of_time() =>
        Gen.Select(Samples.Month, Samples.Month).Sample((a, b) =>
            (a < b) == (a.FirstDay < b.FirstDay) && (a <= b) == (a.FirstDay <= b.FirstDay)
            && (a > b) == (a.FirstDay > b.FirstDay) && (a >= b) == (a.FirstDay >= b.FirstDay)
            && Math.Sign(a.CompareTo(b)) == Math.Sign(a.FirstDay.CompareTo(b.FirstDay)));

    [Fact]
    public void A_range_holds_both_ends() => Assert.Equal(
        [new(2025, 11), new(2025, 12), new(2026, 1)], YearMonth.Range(new(2025, 11), new(2026, 1)));

    [Fact]
    public void A_range_backward_is_empty() => Assert.Empty(YearMonth.Range(new(2026, 1), new(2025, 12)));

    [Theory]
    [InlineData(null)]
    [InlineData("")]
    [InlineData("2026-1")]
    [InlineData("2026-00")]
    [InlineData("2026-13")]
    [InlineData("26-01")]
    [InlineData("2026/01")]
    [InlineData("2026-01-01")]
    [InlineData(" 2026-01")]
    [InlineData("2026-01 ")]
    [InlineData("-026-01")]
    [InlineData("+026-01")]
    [InlineData("2026-+1")]
    [InlineData("２０２６-01")]
    [InlineData("1949-12")]
    [InlineData("9999-01")]
    public void Other_texts_are_refused(string? text)
    {
        Assert.False(YearMonth.TryParse(text, out _));
        Assert.Throws<FormatException>(() => YearMonth.Parse(text!));
    }

    [Theory]
    [InlineData("1950-01", 1950, 1)]
    [InlineData("9998-12", 9998, 12)]
    public void The_first_and_the_last_month_are_read(string text, int year, int month) =>
        Assert.Equal(new YearMonth(year, month), YearMonth.Parse(text));

    [Theory]
    [InlineData(0, 1)]
    [InlineData(10000, 1)]
    [InlineData(2026, 0)]
    [InlineData(2026, 13)]
    public void There_is_no_such_month(int year, int month) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new YearMonth(year, month));
}
