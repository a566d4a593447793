using System.Text;

namespace Bandtide.Core.Sheets;

/// <summary>Reads decimal numbers as whole multiples of their stored resolution, exactly: never by way of binary fractions.</summary>
/// <remarks>
/// Numbers are plain decimals or have an exponent: what JSON allows (RFC 8259, section 6), and beyond it a plus sign, zeros
/// in front and a point without digits on one side of it, which common tools write. No blanks and no thousands separators.
/// </remarks>
internal static class DecimalText
{
    private const int MaxDigits = 17;
    private const int MaxShort = 9;

    // Beyond the length of any text, so that it outweighs any number of zeros.
    private const int MaxExponent = 100_000_000;

    private static readonly long[] Powers = PowersOfTen();

    /// <summary>
    /// Reads the usual short form quickly: at most nine characters behind a minus sign, no plus sign or exponent, no more
    /// decimal places than are kept.
    /// </summary>
    /// <param name="text">The whole text.</param>
    /// <param name="decimals">Decimal places kept, 0 to 4.</param>
    /// <param name="units">The number in whole units, exactly.</param>
    /// <returns>False for everything else, which <see cref="Read"/> judges.</returns>
    public static bool TryShort(ReadOnlySpan<byte> text, int decimals, out long units)
    {
        units = 0;
        var negative = text.Length > 0 && text[0] == '-';
        var digits = negative ? text[1..] : text;
        if (digits.Length > MaxShort)
        {
            return false;
        }

        var point = -1;
        for (var i = 0; i < digits.Length; i++)
        {
            var digit = (uint)digits[i] - '0';
            if (digit <= 9)
            {
                units = units * 10 + digit;
            }
            else if (digits[i] == '.' && point < 0)
            {
                point = i;
            }
            else
            {
                return false;
            }
        }

        var places = point < 0 ? 0 : digits.Length - point - 1;
        if (digits.Length - (point < 0 ? 0 : 1) == 0 || places > decimals)
        {
            return false;
        }

        units *= Powers[decimals - places];
        units = negative ? -units : units;
        return true;
    }

    /// <summary>Reads <c>[+-]digits[.digits][e[+-]digits]</c>.</summary>
    /// <param name="text">The whole text; blanks are not allowed.</param>
    /// <param name="decimals">Decimal places kept, 0 to 14.</param>
    public static DecimalReading Read(ReadOnlySpan<byte> text, int decimals)
    {
        var i = 0;
        var negative = text.Length > 0 && text[0] == '-';
        if (text.Length > 0 && text[0] is (byte)'-' or (byte)'+')
        {
            i++;
        }

        long digits = 0;
        var (kept, seen, point, scale, lost) = (0, 0, false, 0, false);
        for (; i < text.Length; i++)
        {
            var digit = text[i] - '0';
            if ((uint)digit <= 9)
            {
                seen++;
                if (kept < MaxDigits)
                {
                    digits = digits * 10 + digit;
                    kept += digits == 0 ? 0 : 1;
                    scale += point ? 1 : 0;
                }
                else
                {
                    lost |= digit != 0;
                    scale -= point ? 0 : 1;
                }
            }
            else if (text[i] == '.' && !point)
            {
                point = true;
            }
            else
            {
                break;
            }
        }

        if (seen == 0)
        {
            return new(IsNotFinite(text) ? DecimalStatus.NotFinite : DecimalStatus.Syntax, 0, 0);
        }

        if (i < text.Length)
        {
            if (!TryExponent(text[i..], out var exponent))
            {
                return new(DecimalStatus.Syntax, 0, 0);
            }

            scale -= exponent;
        }

        var (units, tail) = Scale(digits, scale - decimals, lost);
        return new(DecimalStatus.Ok, negative ? -units : units, negative ? -tail : tail);
    }

    // digits * 10^-drop as a whole number and what is cut off: 0 nothing, 1 less than half, 2 half or more.
    private static (long Units, int Tail) Scale(long digits, int drop, bool lost)
    {
        if (digits == 0)
        {
            return (0, lost ? 1 : 0);
        }

        if (drop <= 0)
        {
            var huge = -drop >= Powers.Length || digits > long.MaxValue / Powers[-drop];
            return huge ? (long.MaxValue, 0) : (digits * Powers[-drop], lost ? 1 : 0);
        }

        if (drop >= Powers.Length)
        {
            return (0, 1);
        }

        var (units, rest) = Math.DivRem(digits, Powers[drop]);
        var tail = rest == 0 ? (lost ? 1 : 0) : rest >= Powers[drop] / 2 ? 2 : 1;
        return (units, tail);
    }

    private static long[] PowersOfTen()
    {
        var powers = new long[19];
        powers[0] = 1;
        for (var n = 1; n < powers.Length; n++)
        {
            powers[n] = powers[n - 1] * 10;
        }

        return powers;
    }

    private static bool TryExponent(ReadOnlySpan<byte> text, out int exponent)
    {
        exponent = 0;
        if (text[0] is not ((byte)'e' or (byte)'E') || text.Length < 2)
        {
            return false;
        }

        var digits = text[1] is (byte)'-' or (byte)'+' ? text[2..] : text[1..];
        if (digits.IsEmpty)
        {
            return false;
        }

        foreach (var c in digits)
        {
            if (c is < (byte)'0' or > (byte)'9')
            {
                return false;
            }

            exponent = Math.Min(exponent * 10 + (c - '0'), MaxExponent);
        }

        exponent = text[1] == '-' ? -exponent : exponent;
        return true;
    }

    private static bool IsNotFinite(ReadOnlySpan<byte> text)
    {
        var word = text.Length > 0 && text[0] is (byte)'-' or (byte)'+' ? text[1..] : text;
        return Ascii.EqualsIgnoreCase(word, "nan") || Ascii.EqualsIgnoreCase(word, "inf")
            || Ascii.EqualsIgnoreCase(word, "infinity") || word.SequenceEqual("∞"u8);
    }
}
