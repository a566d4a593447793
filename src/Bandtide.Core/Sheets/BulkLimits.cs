namespace Bandtide.Core.Sheets;

/// <summary>Limits of uploads.</summary>
public static class BulkLimits
{
    /// <summary>Days of one body.</summary>
    public const int MaxDays = 4000;

    /// <summary>Decoded bytes of one day: 2 MB.</summary>
    public const int MaxDayBytes = 2_000_000;

    internal const string Incomplete = "The body broke off before it was certain that the day is whole; send it again.";

    /// <summary>Bytes shown of a text that is no date.</summary>
    internal const int MaxShownBytes = 64;
}
