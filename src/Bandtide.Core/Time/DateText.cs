using System.Globalization;

namespace Bandtide.Core.Time;

/// <summary>Dates as they travel: exactly <c>yyyy-MM-dd</c>, ASCII digits, nothing around them.</summary>
/// <remarks>Source: ISO 8601-1:2019, 5.2.2.1, calendar date in extended format. No allocation.</remarks>
public static class DateText
{
    private const string Format10 = "yyyy-MM-dd";

    /// <summary>Reads a date of the years 1 to 9999.</summary>
    public static bool TryParse(ReadOnlySpan<char> text, out DateOnly date)
    {
        date = default;
        return text.Length == 10 && text[4] == '-' && text[7] == '-'
            && TryDigits(text[..4], out var year) && TryDigits(text[5..7], out var month) && TryDigits(text[8..], out var day)
            && TryDate(year, month, day, out date);
    }

    /// <summary>Reads a date of the years 1 to 9999 from UTF-8.</summary>
    public static bool TryParse(ReadOnlySpan<byte> utf8Text, out DateOnly date)
    {
        date = default;
        if (utf8Text.Length != 10)
        {
            return false;
        }

        Span<char> text = stackalloc char[10];
        for (var i = 0; i < text.Length; i++)
        {
            text[i] = (char)utf8Text[i];
        }

        return TryParse(text, out date);
    }

    /// <summary>Writes <c>yyyy-MM-dd</c>.</summary>
    public static string Format(DateOnly date) => date.ToString(Format10, CultureInfo.InvariantCulture);

    /// <summary>Reads a whole text of ASCII digits, at most nine.</summary>
    internal static bool TryDigits(ReadOnlySpan<char> text, out int value)
    {
        value = 0;
        foreach (var c in text)
        {
            if (!char.IsAsciiDigit(c))
            {
                return false;
            }

            value = 10 * value + (c - '0');
        }

        return text.Length is > 0 and < 10;
    }

    private static bool TryDate(int year, int month, int day, out DateOnly date)
    {
        date = default;
        if (year < 1 || month is < 1 or > 12 || day < 1 || day > DateTime.DaysInMonth(year, month))
        {
            return false;
        }

        date = new(year, month, day);
        return true;
    }
}
