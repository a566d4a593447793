using Bandtide.Core.Sun;
using Bandtide.Testing;
using CsCheck;

namespace Bandtide.Core.Tests.Sun;

public sealed class ApparentSolarTimeTests
{
    [Fact]
    public void Hours_and_day_offset_agree_with_a_library()
    {
        Assert.All(ReferenceTable.Load("local_apparent_solar_time.csv"), row =>
        {
            var time = ApparentSolarTime.At(row.Instant("utc"), row.Number("lon_deg"));
            var hours = row.Number("local_apparent_solar_time_h");
            var apart = Math.Abs(time.Hours - hours);
            Assert.True(Math.Min(apart, 24 - apart) <= 0.002, $"{row}: expected {hours} h, found {time}");

            // Within ten seconds of midnight either date is right.
            if (Math.Min(hours, 24 - hours) * 3600 > 10)
            {
                Assert.Equal((int)row.Number("local_apparent_date_offset_days"), time.DayOffset);
            }
        });
    }

    [Fact]
    public void Hours_stay_in_the_day_and_with_the_offset_count_on_from_UTC() =>
        Gen.Select(Samples.Instant, Gen.Double[-180, 180]).Sample((instant, longitude) =>
        {
            var time = ApparentSolarTime.At(instant, longitude);
            var mean = instant.TimeOfDay.TotalHours + longitude / 15;
            return time.Hours is >= 0 and < 24 && time.DayOffset is >= -1 and <= 1
                && Math.Abs(time.Hours + 24 * time.DayOffset - mean) * 60 < 17;
        });

    [Fact]
    public void It_is_noon_when_the_Sun_stands_in_the_meridian() =>
        Samples.Instant.Sample(instant =>
            Math.Abs(ApparentSolarTime.At(instant, SolarPosition.Subsolar(instant).LongitudeDegrees).Hours - 12) < 1e-4);
}
