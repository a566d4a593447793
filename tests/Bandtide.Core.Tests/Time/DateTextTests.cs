using System.Globalization;
using System.Text;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Time;

public sealed class DateTextTests
{
    [Fact]
    public void Every_date_is_read_as_it_was_written() =>
        Gen.Int[DateOnly.MinValue.DayNumber, DateOnly.MaxValue.DayNumber].Select(DateOnly.FromDayNumber).Sample(date =>
            DateText.TryParse(DateText.Format(date), out var fromText) && fromText == date
            && DateText.TryParse(Encoding.UTF8.GetBytes(DateText.Format(date)), out var fromBytes) && fromBytes == date);

    [Theory]
    [InlineData("")]
    [InlineData("2026-02-29")]
    [InlineData("2026-00-01")]
    [InlineData("2026-13-01")]
    [InlineData("2026-01-00")]
    [InlineData("2026-01-32")]
    [InlineData("0000-01-01")]
    [InlineData("2026-1-1")]
    [InlineData("2026-01-01T")]
    [InlineData(" 2026-01-1")]
    [InlineData("2026/01/01")]
    [InlineData("01-01-2026")]
    [InlineData("20260101")]
    [InlineData("２026-01-01")]
    public void Other_texts_are_refused(string text)
    {
        Assert.False(DateText.TryParse(text, out _));
        Assert.False(DateText.TryParse(Encoding.UTF8.GetBytes(text), out _));
    }

    // Among the base library's dates these are the ones that its exact parsing accepts too.
    [Fact]
    public void Mangled_dates_are_judged_as_by_the_base_library() =>
        Gen.String[Gen.Char["0123456789-"], 10, 10].Sample(text =>
            DateText.TryParse(text, out var date)
            == DateOnly.TryParseExact(text, "yyyy-MM-dd", CultureInfo.InvariantCulture, DateTimeStyles.None, out var theirs) && date == theirs);
}
