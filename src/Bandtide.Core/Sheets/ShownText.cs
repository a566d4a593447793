using System.Text;

namespace Bandtide.Core.Sheets;

/// <summary>Received bytes as people may see them: cut when long, marks for control characters and for what is not UTF-8.</summary>
internal static class ShownText
{
    private const char Mark = '\uFFFD';
    private const int MaxQuoted = 40;

    /// <summary>A value in quotes, for a message.</summary>
    public static string Quote(ReadOnlySpan<byte> text) => $"'{Cut(text, MaxQuoted)}'";

    /// <summary>The first bytes of a text, never half a character.</summary>
    public static string Cut(ReadOnlySpan<byte> text, int max)
    {
        var end = Math.Min(text.Length, max);
        while (end < text.Length && end > max - 4 && (text[end] & 0xC0) == 0x80)
        {
            end--;
        }

        var shown = Encoding.UTF8.GetString(text[..end]).Select(c => char.IsControl(c) ? Mark : c);
        return string.Concat(shown) + (end < text.Length ? "…" : "");
    }

    /// <summary>A name, for a message.</summary>
    public static string Cut(ReadOnlySpan<byte> name) => Cut(name, MaxQuoted);

    /// <inheritdoc cref="Cut(ReadOnlySpan{byte})"/>
    public static string Cut(string name) => Cut(Encoding.UTF8.GetBytes(name), MaxQuoted);
}
