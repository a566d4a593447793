using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Time;

public sealed class UtcHourTests
{
    [Fact]
    public void An_hour_holds_its_instants_and_no_other() =>
        Gen.Select(Samples.Instant, Gen.Int[-14, 14]).Sample((instant, offset) =>
        {
            var hour = UtcHour.Containing(instant.ToOffset(TimeSpan.FromHours(offset)));
            return hour.Start <= instant && instant < hour.End && hour.End - hour.Start == TimeSpan.FromHours(1)
                && hour.Date == DateOnly.FromDateTime(instant.UtcDateTime) && hour.HourOfDay == instant.UtcDateTime.Hour
                && UtcHour.Of(hour.Date, hour.HourOfDay) == hour;
        });

    // Around the epoch and before it, where whole-number division would round towards it.
    [Theory]
    [InlineData(0, "1970-01-01T00Z")]
    [InlineData(-1, "1969-12-31T23Z")]
    [InlineData(-24, "1969-12-31T00Z")]
    [InlineData(-25, "1969-12-30T23Z")]
    public void Hours_around_the_epoch(int hours, string text) => Assert.Equal(text, new UtcHour(hours).ToString());

    [Fact]
    public void Order_is_that_of_time() =>
        Gen.Select(Gen.Int[-200_000, 800_000], Gen.Int[-3, 3]).Sample((start, step) =>
        {
            var (a, b) = (new UtcHour(start), new UtcHour(start).AddHours(step));
            return (a < b) == (step > 0) && (a > b) == (step < 0) && (a <= b) == (step >= 0) && (a >= b) == (step <= 0)
                && Math.Sign(a.CompareTo(b)) == -Math.Sign(step);
        });

    [Theory]
    [InlineData(-1)]
    [InlineData(24)]
    public void There_is_no_such_hour_of_the_day(int hour) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => UtcHour.Of(new(2026, 1, 1), hour));
}
