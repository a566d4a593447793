namespace Bandtide.Core.Sheets;

/// <summary>Limits of uploads.</summary>
public static class BulkLimits
{
    /// <summary>Days of one body.</summary>
    public const int MaxDays = 4000;

    /// <summary>Decoded bytes of one day: 2 MB.</summary>
    public const int MaxDayBytes = 2_000_000;

    internal const int MaxShownText = 64;

    internal static string Shown(ReadOnlySpan<byte> text)
    {
        var cut = text.Length > MaxShownText ? text[..MaxShownText] : text;
        var shown = string.Concat(System.Text.Encoding.UTF8.GetString(cut).Select(c => char.IsControl(c) ? '\uFFFD' : c));
        return text.Length > MaxShownText ? shown + "…" : shown;
    }
}
