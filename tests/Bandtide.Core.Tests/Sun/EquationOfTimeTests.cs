using Bandtide.Core.Sun;
using Bandtide.Testing;

namespace Bandtide.Core.Tests.Sun;

public sealed class EquationOfTimeTests
{
    private const double ToleranceMinutes = 0.02;

    [Fact]
    public void Two_years_agree_with_two_libraries()
    {
        Assert.All(ReferenceTable.Load("equation_of_time.csv"), row =>
        {
            var instant = row.Instant("utc");
            Assert.Equal(row.Number("eot_astronomy_engine_min"), EquationOfTime.Minutes(instant), ToleranceMinutes);
            Assert.Equal(row.Number("eot_pyephem_min"), EquationOfTime.Minutes(instant), ToleranceMinutes);
            Assert.Equal(row.Number("sun_declination_deg"), ApparentSun.At(instant).DeclinationDegrees, 0.003);
        });
    }

    [Fact]
    public void A_century_agrees_with_a_library()
    {
        Assert.All(ReferenceTable.Load("solar_position_century.csv"), row =>
        {
            var instant = row.Instant("utc");
            Assert.Equal(row.Number("equation_of_time_min"), EquationOfTime.Minutes(instant), ToleranceMinutes);
            Assert.Equal(row.Number("declination_deg"), ApparentSun.At(instant).DeclinationDegrees, 0.001);
        });
    }
}
