namespace Bandtide.Storage.Engine;

/// <summary>Dates as stored: whole days since 1970-01-01, negative before.</summary>
internal static class EpochDay
{
    private static readonly int Epoch = new DateOnly(1970, 1, 1).DayNumber;

    public static int Of(DateOnly date) => date.DayNumber - Epoch;

    public static DateOnly ToDate(int day) => DateOnly.FromDayNumber(day + Epoch);
}
