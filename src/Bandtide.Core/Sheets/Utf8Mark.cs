namespace Bandtide.Core.Sheets;

/// <summary>The byte order mark that some programs put before UTF-8 (RFC 3629, section 6).</summary>
internal static class Utf8Mark
{
    public const int Length = 3;

    /// <summary>Its length where a body begins with it, else 0.</summary>
    public static int LengthIn(ReadOnlySpan<byte> body) => body.StartsWith((ReadOnlySpan<byte>)[0xEF, 0xBB, 0xBF]) ? Length : 0;
}
