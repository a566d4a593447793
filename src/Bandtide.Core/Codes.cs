namespace Bandtide.Core;

/// <summary>Codes of stations, regions and bands: 2 to 24 characters of <c>a-z 0-9 -</c>.</summary>
public static class Codes
{
    /// <summary>Fewest characters of a code.</summary>
    public const int MinLength = 2;

    /// <summary>Most characters of a code.</summary>
    public const int MaxLength = 24;

    /// <summary>Whether the text is a code. Nothing is trimmed and no case is folded.</summary>
    public static bool IsValid(string? text) => text is not null && IsValid(text.AsSpan());

    /// <inheritdoc cref="IsValid(string)"/>
    public static bool IsValid(ReadOnlySpan<char> text) =>
        text.Length is >= MinLength and <= MaxLength && text.IndexOfAnyExcept(Allowed) < 0;

    private static readonly System.Buffers.SearchValues<char> Allowed =
        System.Buffers.SearchValues.Create("abcdefghijklmnopqrstuvwxyz0123456789-");
}
