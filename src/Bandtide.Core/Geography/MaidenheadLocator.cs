using System.Diagnostics.CodeAnalysis;

namespace Bandtide.Core.Geography;

/// <summary>A cell of the Maidenhead locator system: field, square, subsquare or extended square.</summary>
/// <remarks>
/// Pairs of characters alternate longitude first, then latitude, counted from 180 W and the south pole: letters A-R divide
/// the Earth in fields of 20 x 10 degrees, digits these in squares of 2 x 1 degrees, letters a-x these in subsquares of
/// 5 x 2.5 minutes, digits these in extended squares of 30 x 15 seconds. A cell holds its southern and western edge, not
/// its northern and eastern one. Source: IARU Region 1 VHF Managers Handbook, Maidenhead locator system (1980 definition).
/// This project's conventions where the definition is open: longitude +180 wraps to -180, the north pole is clamped into the
/// last row, white space around a text is trimmed, letters are read in either case and written as in <c>JO62qm57</c>.
/// <c>default</c> is the square AA00.
/// </remarks>
public readonly record struct MaidenheadLocator : IParsable<MaidenheadLocator>, ISpanParsable<MaidenheadLocator>
{
    /// <summary>Length of a locator that names a square, the only precision in which station positions are published.</summary>
    public const int SquareLength = 4;

    // Cells around the Earth, and from pole to pole, for lengths 2, 4, 6 and 8.
    private static readonly int[] CellsPerTurn = [18, 180, 4320, 43200];

    private readonly int column;
    private readonly int row;
    private readonly sbyte lengthBeyondSquare;

    private MaidenheadLocator(int column, int row, int length) =>
        (this.column, this.row, lengthBeyondSquare) = (column, row, (sbyte)(length - SquareLength));

    /// <summary>Number of characters: 2, 4, 6 or 8.</summary>
    public int Length => SquareLength + lengthBeyondSquare;

    /// <summary>Latitude of the southern edge, degrees.</summary>
    public double South => LatitudeOfEdge(row, Length);

    /// <summary>Latitude of the northern edge, degrees.</summary>
    public double North => LatitudeOfEdge(row + 1, Length);

    /// <summary>Longitude of the western edge, degrees, -180 up to but not including 180.</summary>
    public double West => LongitudeOfEdge(column, Length);

    /// <summary>Longitude of the eastern edge, degrees, above -180 up to 180.</summary>
    public double East => LongitudeOfEdge(column + 1, Length);

    /// <summary>The middle of the cell.</summary>
    public GeoPoint Centre => new((South + North) / 2, (West + East) / 2);

    /// <summary>The field (2 characters) that holds the cell.</summary>
    public MaidenheadLocator Field => Truncate(2);

    /// <summary>The square (4 characters) that holds the cell, or <c>null</c> for a field, which holds a hundred.</summary>
    public MaidenheadLocator? Square => Length >= SquareLength ? Truncate(SquareLength) : null;

    /// <summary>The cell of a given precision that holds a point.</summary>
    /// <param name="point">The point.</param>
    /// <param name="length">2, 4, 6 or 8 characters.</param>
    /// <exception cref="ArgumentOutOfRangeException">Another length.</exception>
    public static MaidenheadLocator FromPoint(GeoPoint point, int length)
    {
        ThrowIfNoLength(length);
        var cells = Cells(length);
        var longitude = point.LongitudeDegrees >= 180 ? -180 : point.LongitudeDegrees;
        var x = (int)Math.Clamp(Math.Floor((longitude + 180) / 360 * cells), 0, cells - 1);
        var y = (int)Math.Clamp(Math.Floor((point.LatitudeDegrees + 90) / 180 * cells), 0, cells - 1);

        // The scaling above may round across an edge; the edges themselves are correctly rounded and decide.
        x += Step(longitude, LongitudeOfEdge(x, length), LongitudeOfEdge(x + 1, length));
        y += Step(point.LatitudeDegrees, LatitudeOfEdge(y, length), LatitudeOfEdge(y + 1, length));
        return new(x, Math.Min(y, cells - 1), length);
    }

    /// <summary>The coarser cell that holds this one.</summary>
    /// <param name="length">2, 4, 6 or 8, at most <see cref="Length"/>.</param>
    /// <exception cref="ArgumentOutOfRangeException">Another length.</exception>
    public MaidenheadLocator Truncate(int length)
    {
        ThrowIfNoLength(length);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(length, Length);
        var ratio = Cells(Length) / Cells(length);
        return new(column / ratio, row / ratio, length);
    }

    /// <summary>Whether another cell is this one or lies in it.</summary>
    public bool Contains(MaidenheadLocator other) => other.Length >= Length && other.Truncate(Length) == this;

    /// <summary>Whether a point lies in the cell.</summary>
    public bool Contains(GeoPoint point) => FromPoint(point, Length) == this;

    /// <summary>Canonical text, such as <c>JO62qm57</c>.</summary>
    public override string ToString()
    {
        Span<char> text = stackalloc char[8];
        var (c, r) = (column, row);
        for (var pair = Length / 2 - 1; pair >= 0; pair--)
        {
            var symbols = Symbols(pair);
            text[2 * pair] = (char)(First(pair) + c % symbols);
            text[2 * pair + 1] = (char)(First(pair) + r % symbols);
            (c, r) = (c / symbols, r / symbols);
        }

        return text[..Length].ToString();
    }

    /// <summary>Reads 2, 4, 6 or 8 characters in either case; white space around them is trimmed.</summary>
    /// <exception cref="FormatException">Anything else; the message quotes the text.</exception>
    public static MaidenheadLocator Parse(string s) => TryParse(s, out var locator)
        ? locator
        : throw new FormatException($"'{s}' is not a Maidenhead locator of 2, 4, 6 or 8 characters.");

    /// <inheritdoc cref="Parse(string)"/>
    public static MaidenheadLocator Parse(string s, IFormatProvider? provider) => Parse(s);

    /// <inheritdoc cref="Parse(string)"/>
    public static MaidenheadLocator Parse(ReadOnlySpan<char> s, IFormatProvider? provider) => Parse(s.ToString());

    /// <summary>Reads 2, 4, 6 or 8 characters in either case; white space around them is trimmed.</summary>
    public static bool TryParse([NotNullWhen(true)] string? s, out MaidenheadLocator result) => TryParse(s, null, out result);

    /// <inheritdoc/>
    public static bool TryParse([NotNullWhen(true)] string? s, IFormatProvider? provider, out MaidenheadLocator result) =>
        TryParse(s.AsSpan(), provider, out result);

    /// <inheritdoc/>
    public static bool TryParse(ReadOnlySpan<char> s, IFormatProvider? provider, out MaidenheadLocator result)
    {
        result = default;
        var text = s.Trim();
        if (text.Length is not (2 or 4 or 6 or 8))
        {
            return false;
        }

        var (x, y) = (0, 0);
        for (var pair = 0; pair < text.Length / 2; pair++)
        {
            var (symbols, first) = (Symbols(pair), char.ToLowerInvariant(First(pair)));
            var (c, r) = (AsciiLower(text[2 * pair]) - first, AsciiLower(text[2 * pair + 1]) - first);
            if (c < 0 || c >= symbols || r < 0 || r >= symbols)
            {
                return false;
            }

            (x, y) = (x * symbols + c, y * symbols + r);
        }

        result = new(x, y, text.Length);
        return true;
    }

    private static int Cells(int length) => CellsPerTurn[length / 2 - 1];

    private static int Symbols(int pair) => pair switch { 0 => 18, 2 => 24, _ => 10 };

    private static char First(int pair) => pair switch { 0 => 'A', 2 => 'a', _ => '0' };

    private static char AsciiLower(char c) => char.IsAsciiLetterUpper(c) ? (char)(c | 0x20) : c;

    // Whole numbers up to the division, so that an edge is the double nearest to the true one at every precision.
    private static double LongitudeOfEdge(int edge, int length) => (360.0 * edge - 180.0 * Cells(length)) / Cells(length);

    private static double LatitudeOfEdge(int edge, int length) => (180.0 * edge - 90.0 * Cells(length)) / Cells(length);

    private static int Step(double value, double lowEdge, double highEdge) => value < lowEdge ? -1 : value >= highEdge ? 1 : 0;

    private static void ThrowIfNoLength(int length)
    {
        if (length is not (2 or 4 or 6 or 8))
        {
            throw new ArgumentOutOfRangeException(nameof(length), length, "A locator has 2, 4, 6 or 8 characters.");
        }
    }
}
