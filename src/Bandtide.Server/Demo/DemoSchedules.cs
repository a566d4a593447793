namespace Bandtide.Server.Demo;

/// <summary>When transmitters are on. Invented, but for the date on which broadcasters change their schedules.</summary>
internal static class DemoSchedules
{
    public const int UseCount = 4;
    private static readonly float[] Broadcasting =
    [
        .55f, .40f, .35f, .35f, .45f, .65f, .85f, .85f, .70f, .55f, .50f, .50f, .50f, .50f, .50f, .55f, .65f, .80f, .95f, 1f, 1f, 1f, .90f, .70f,
    ];

    private static readonly float[] Amateur =
    [
        .30f, .20f, .15f, .12f, .12f, .18f, .30f, .45f, .55f, .60f, .65f, .65f, .65f, .65f, .65f, .70f, .75f, .85f, .95f, 1f, 1f, .95f, .75f, .50f,
    ];

    /// <summary>Share of transmitters that are on.</summary>
    /// <param name="use">Who transmits.</param>
    /// <param name="localHour">Hour of the day by the Sun where they stand, 0 to 23.</param>
    /// <param name="isWeekend">Saturday or Sunday.</param>
    public static float On(DemoUse use, int localHour, bool isWeekend) => use switch
    {
        DemoUse.Broadcasting => Broadcasting[localHour],
        DemoUse.Amateur => Amateur[localHour] * (isWeekend ? 1.3f : 1f),
        DemoUse.Standard => 1f,
        _ => 0.5f + 0.5f * Broadcasting[localHour],
    };

    /// <summary>Whether a date lies in the summer season of high-frequency broadcasting.</summary>
    /// <remarks>Seasonal schedules change on the last Sundays of March and October: ITU Radio Regulations, Article 12 (from memory).</remarks>
    public static bool IsSummerSeason(DateOnly date) => date >= LastSunday(date.Year, 3) && date < LastSunday(date.Year, 10);

    private static DateOnly LastSunday(int year, int month)
    {
        var last = new DateOnly(year, month, DateTime.DaysInMonth(year, month));
        return last.AddDays(-(int)last.DayOfWeek);
    }
}
