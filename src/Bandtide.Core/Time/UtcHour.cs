namespace Bandtide.Core.Time;

/// <summary>One whole hour of UTC, as hours since 1970-01-01T00:00Z (negative before).</summary>
/// <param name="HoursSinceEpoch">Hours since the Unix epoch; <c>default</c> is the first hour of 1970.</param>
public readonly record struct UtcHour(int HoursSinceEpoch) : IComparable<UtcHour>
{
    private static readonly int EpochDay = DateOnly.FromDateTime(DateTime.UnixEpoch).DayNumber;

    /// <summary>The instant the hour begins.</summary>
    public DateTimeOffset Start => DateTimeOffset.UnixEpoch.AddHours(HoursSinceEpoch);

    /// <summary>The instant the hour has ended, which no longer belongs to it.</summary>
    public DateTimeOffset End => Start.AddHours(1);

    /// <summary>The UTC date.</summary>
    public DateOnly Date => DateOnly.FromDayNumber(EpochDay + (HoursSinceEpoch - HourOfDay) / 24);

    /// <summary>Hour of the UTC day, 0 to 23.</summary>
    public int HourOfDay => (HoursSinceEpoch % 24 + 24) % 24;

    /// <summary>The hour that holds an instant.</summary>
    public static UtcHour Containing(DateTimeOffset instant) =>
        new((int)Math.Floor((instant - DateTimeOffset.UnixEpoch).TotalHours));

    /// <summary>The hour of a UTC date.</summary>
    /// <param name="date">UTC date.</param>
    /// <param name="hourOfDay">0 to 23.</param>
    /// <exception cref="ArgumentOutOfRangeException">No such hour of the day.</exception>
    public static UtcHour Of(DateOnly date, int hourOfDay)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan((uint)hourOfDay, 23u, nameof(hourOfDay));
        return new((date.DayNumber - EpochDay) * 24 + hourOfDay);
    }

    /// <summary>The hour so many hours later (earlier where negative).</summary>
    public UtcHour AddHours(int hours) => new(HoursSinceEpoch + hours);

    /// <inheritdoc/>
    public int CompareTo(UtcHour other) => HoursSinceEpoch.CompareTo(other.HoursSinceEpoch);

    /// <summary>Such as <c>2026-06-01T05Z</c>.</summary>
    public override string ToString() =>
        string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{DateText.Format(Date)}T{HourOfDay:00}Z");

    /// <summary>Earlier than.</summary>
    public static bool operator <(UtcHour left, UtcHour right) => left.HoursSinceEpoch < right.HoursSinceEpoch;

    /// <summary>Later than.</summary>
    public static bool operator >(UtcHour left, UtcHour right) => left.HoursSinceEpoch > right.HoursSinceEpoch;

    /// <summary>Not later than.</summary>
    public static bool operator <=(UtcHour left, UtcHour right) => left.HoursSinceEpoch <= right.HoursSinceEpoch;

    /// <summary>Not earlier than.</summary>
    public static bool operator >=(UtcHour left, UtcHour right) => left.HoursSinceEpoch >= right.HoursSinceEpoch;
}
