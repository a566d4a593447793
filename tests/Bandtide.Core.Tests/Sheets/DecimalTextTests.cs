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

    // The exponent moves the point of the same digits, which System.Decimal can follow exactly.
    [Fact]
    public void Exponents_move_the_point() =>
        Gen.Select(Gen.Long[-999_999_999, 999_999_999], Gen.Int[-12, 5], Gen.Int[0, 4], SheetSamples.OneOf("e", "E")).Sample((digits, exponent, decimals, letter) =>
        {
            var exact = digits * Enumerable.Repeat(exponent < 0 ? 0.1m : 10m, Math.Abs(exponent)).Aggregate(1m, (product, factor) => product * factor);
            var reading = DecimalText.Read(Encoding.ASCII.GetBytes(string.Create(CultureInfo.InvariantCulture, $"{digits}{letter}{exponent}")), decimals);
            Assert.Equal(decimal.Round(exact, decimals, MidpointRounding.AwayFromZero) * (decimal)Math.Pow(10, decimals), reading.Rounded);
        });

    [Fact]
    public void The_quick_way_reads_what_the_full_way_reads() =>
        Gen.Select(SheetSamples.OneOf("", "-"), Gen.Char["0123456789."].Array[0, 11], Gen.Int[0, 4]).Sample((sign, characters, decimals) =>
        {
            var text = Encoding.ASCII.GetBytes(sign + new string(characters));
            if (DecimalText.TryShort(text, decimals, out var units))
            {
                Assert.Equal(new DecimalReading(DecimalStatus.Ok, units, 0), DecimalText.Read(text, decimals));
            }
        }, iter: 20_000);

    [Theory]
    [InlineData("-78.60", true)]
    [InlineData("0.4312", false)]
    [InlineData("-0.00", true)]
    [InlineData("720", true)]
    public void What_stations_write_is_read_the_quick_way(string text, bool at2) =>
        Assert.Equal((at2, true), (DecimalText.TryShort(Encoding.ASCII.GetBytes(text), 2, out _), DecimalText.TryShort(Encoding.ASCII.GetBytes(text), 4, out _)));

    [Fact]
    public void Numbers_far_too_long_or_large_are_judged_all_the_same()
    {
        var zeros = new string('0', 20_000);
        Assert.Equal(1, DecimalText.Read(Encoding.ASCII.GetBytes($"0.{zeros}1e20001"), 0).Units);
        Assert.Equal(1, DecimalText.Read(Encoding.ASCII.GetBytes($"1{zeros}e-20000"), 0).Units);
        Assert.False(DecimalText.Read(Encoding.ASCII.GetBytes("1e999999999999"), 2).Within(-30_000, 30_000));
        Assert.False(DecimalText.Read(Encoding.ASCII.GetBytes($"-9{zeros}"), 2).Within(-30_000, 30_000));
        Assert.True(DecimalText.Read(Encoding.ASCII.GetBytes("9e-999999999999"), 2).Within(0, 30_000));
    }

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
