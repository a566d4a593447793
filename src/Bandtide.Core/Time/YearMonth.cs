using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace Bandtide.Core.Time;

/// <summary>One calendar month of the proleptic Gregorian calendar, in UTC.</summary>
/// <remarks>
/// Kept as one integer (<see cref="Number"/>), the same in every database. <c>default</c> is month 0000-01, which no text
/// and no date gives.
/// </remarks>
/// <param name="Year">Year, 1 to 9999.</param>
/// <param name="Month">Month of the year, 1 to 12.</param>
/// <exception cref="ArgumentOutOfRangeException">Year or month out of range.</exception>
public readonly record struct YearMonth(int Year, int Month)
    : IParsable<YearMonth>, ISpanParsable<YearMonth>, IComparable<YearMonth>
{
    /// <summary>First year a text may name.</summary>
    public const int MinParsedYear = 1950;

    /// <summary>Last year a text may name: one short of what dates can hold, so that the month after exists.</summary>
    public const int MaxParsedYear = 9998;

    /// <summary>Months since 0000-01: 12 x year + month - 1. The integer stored in databases.</summary>
    public int Number { get; } = 12 * Checked(Year, 9999) + Checked(Month, 12) - 1;

    /// <summary>Year, 1 to 9999.</summary>
    public int Year => Number / 12;

    /// <summary>Month of the year, 1 to 12.</summary>
    public int Month => Number % 12 + 1;

    /// <summary>First date of the month.</summary>
    public DateOnly FirstDay => new(Year, Month, 1);

    /// <summary>Last date of the month.</summary>
    public DateOnly LastDay => new(Year, Month, Days);

    /// <summary>Number of days, 28 to 31.</summary>
    public int Days => DateTime.DaysInMonth(Year, Month);

    /// <summary>The month with this <see cref="Number"/>.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Not a month of the years 1 to 9999.</exception>
    public static YearMonth FromNumber(int number)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(number);
        return new(number / 12, number % 12 + 1);
    }

    /// <summary>The month that holds a date.</summary>
    public static YearMonth Of(DateOnly date) => new(date.Year, date.Month);

    /// <summary>All months from one to another, both included; none where <paramref name="to"/> is earlier.</summary>
    public static IEnumerable<YearMonth> Range(YearMonth from, YearMonth to)
    {
        for (var number = from.Number; number <= to.Number; number++)
        {
            yield return FromNumber(number);
        }
    }

    /// <summary>The month so many months later (earlier where negative).</summary>
    /// <exception cref="ArgumentOutOfRangeException">The result lies outside the years 1 to 9999.</exception>
    public YearMonth AddMonths(int months) => FromNumber(Number + months);

    /// <summary>Whether a date lies in the month.</summary>
    public bool Contains(DateOnly date) => date.Year == Year && date.Month == Month;

    /// <inheritdoc/>
    public int CompareTo(YearMonth other) => Number.CompareTo(other.Number);

    /// <summary>Exactly <c>yyyy-MM</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Year:0000}-{Month:00}");

    /// <summary>Reads exactly <c>yyyy-MM</c>, years 1950 to 9998.</summary>
    /// <exception cref="FormatException">Anything else; the message quotes the text.</exception>
    public static YearMonth Parse(string s) =>
        TryParse(s, out var month) ? month : throw new FormatException($"'{s}' is not a month (yyyy-MM).");

    /// <inheritdoc cref="Parse(string)"/>
    public static YearMonth Parse(string s, IFormatProvider? provider) => Parse(s);

    /// <inheritdoc cref="Parse(string)"/>
    public static YearMonth Parse(ReadOnlySpan<char> s, IFormatProvider? provider) => Parse(s.ToString());

    /// <summary>Reads exactly <c>yyyy-MM</c>, years 1950 to 9998.</summary>
    public static bool TryParse([NotNullWhen(true)] string? s, out YearMonth result) => TryParse(s, null, out result);

    /// <inheritdoc/>
    public static bool TryParse([NotNullWhen(true)] string? s, IFormatProvider? provider, out YearMonth result) =>
        TryParse(s.AsSpan(), provider, out result);

    /// <inheritdoc/>
    public static bool TryParse(ReadOnlySpan<char> s, IFormatProvider? provider, out YearMonth result)
    {
        result = default;
        if (s.Length != 7 || s[4] != '-'
            || !DateText.TryDigits(s[..4], out var year) || !DateText.TryDigits(s[5..], out var month)
            || year is < MinParsedYear or > MaxParsedYear || month is < 1 or > 12)
        {
            return false;
        }

        result = new(year, month);
        return true;
    }

    /// <summary>Earlier than.</summary>
    public static bool operator <(YearMonth left, YearMonth right) => left.Number < right.Number;

    /// <summary>Later than.</summary>
    public static bool operator >(YearMonth left, YearMonth right) => left.Number > right.Number;

    /// <summary>Not later than.</summary>
    public static bool operator <=(YearMonth left, YearMonth right) => left.Number <= right.Number;

    /// <summary>Not earlier than.</summary>
    public static bool operator >=(YearMonth left, YearMonth right) => left.Number >= right.Number;

    private static int Checked(int value, int largest, [System.Runtime.CompilerServices.CallerArgumentExpression(nameof(value))] string? name = null)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(value, 1, name);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(value, largest, name);
        return value;
    }
}
