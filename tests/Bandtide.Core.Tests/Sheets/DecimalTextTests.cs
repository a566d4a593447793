using System.Globalization;
using System.Text;
using Bandtide.Core.Sheets;
using CsCheck;

namespace Bandtide.Core.Tests.Sheets;

public sealed class DecimalTextTests
{
    // System.Decimal with MidpointRounding.AwayFromZero is the independent reference.
    [Fact]
    public void Rounding_is_half_away_from_zero_in_decimal() =>
        Gen.Select(Gen.Int[-400, 400], Gen.Int[0, 999_999_999], Gen.Int[0, 9], Gen.Int[0, 4]).Sample((whole, fraction, places, decimals) =>
        {
            var text = places == 0 ? whole.ToString(CultureInfo.InvariantCulture) : $"{(whole == 0 ? "-" : "")}{whole}.{fraction.ToString("D9", CultureInfo.InvariantCulture)[..places]}";
            var reading = DecimalText.Read(Encoding.ASCII.GetBytes(text), decimals);
            var exact = decimal.Parse(text, CultureInfo.InvariantCulture);
            var scale = (decimal)Math.Pow(10, decimals);
            Assert.Equal(DecimalStatus.Ok, reading.Status);
            Assert.Equal(decimal.Round(exact, decimals, MidpointRounding.AwayFromZero) * scale, reading.Rounded);
            Assert.Equal(exact is >= 0 and <= 1, reading.Within(0, (long)scale));
        });

    [Theory]
    [InlineData("0.00005", 4, 1)]
    [InlineData("-78.605", 2, -7861)]
    [InlineData("-78.604999999999999999999", 2, -7860)]
    [InlineData("7.5e2", 0, 750)]
    [InlineData("1E-4", 4, 1)]
    [InlineData("0000000000000000000000000000001.25", 2, 125)]
    [InlineData("+3", 0, 3)]
    [InlineData(".5", 4, 5000)]
    public void Numbers_are_read_exactly(string text, int decimals, long units) =>
        Assert.Equal(units, DecimalText.Read(Encoding.ASCII.GetBytes(text), decimals).Rounded);

    [Theory]
    [InlineData("NaN", true)]
    [InlineData("-Infinity", true)]
    [InlineData("inf", true)]
    [InlineData("", false)]
    [InlineData("-", false)]
    [InlineData("1,5", false)]
    [InlineData("1 000", false)]
    [InlineData(" 1", false)]
    [InlineData("1.2.3", false)]
    [InlineData("1e", false)]
    [InlineData("0x10", false)]
    public void What_is_no_number_is_told_apart_from_what_is_not_finite(string text, bool notFinite) =>
        Assert.Equal(notFinite ? DecimalStatus.NotFinite : DecimalStatus.Syntax, DecimalText.Read(Encoding.ASCII.GetBytes(text), 2).Status);
}
