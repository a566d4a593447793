namespace Bandtide.Core.Sheets;

/// <summary>Reads decimal numbers as whole multiples of their stored resolution, exactly: never by way of binary fractions.</summary>
internal static class DecimalText
{
    private const int MaxDigits = 17;
    private static readonly long[] Powers = [.. Enumerable.Range(0, 19).Select(n => (long)Math.Pow(10, n))];

    /// <summary>Reads <c>[+-]digits[.digits][e[+-]digits]</c>.</summary>
    /// <param name="text">The whole text; blanks are not allowed.</param>
    /// <param name="decimals">Decimal places kept, 0 to 4.</param>
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

            exponent = Math.Min(exponent * 10 + (c - '0'), 10_000);
        }

        exponent = text[1] == '-' ? -exponent : exponent;
        return true;
    }

    private static bool IsNotFinite(ReadOnlySpan<byte> text)
    {
        var word = text.Length > 0 && text[0] is (byte)'-' or (byte)'+' ? text[1..] : text;
        foreach (var name in (ReadOnlySpan<string>)["nan", "inf", "infinity", "∞"])
        {
            if (System.Text.Encoding.UTF8.GetString(word).Equals(name, StringComparison.OrdinalIgnoreCase))
            {
                return true;
            }
        }

        return false;
    }
}
