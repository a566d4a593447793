using System.Buffers.Text;
using System.Globalization;

namespace Bandtide.Core.Sheets;

/// <summary>Stored whole numbers as decimal text.</summary>
public static class FixedPoint
{
    private static readonly uint[] Units = [1, 10, 100, 1_000, 10_000];

    /// <summary>A value in its stored resolution, with all its decimal places: <c>-7860</c> at 2 is <c>-78.60</c>.</summary>
    public static string Text(int value, int decimals) =>
        new decimal(Math.Abs(value), 0, 0, value < 0, (byte)decimals).ToString(CultureInfo.InvariantCulture);

    /// <summary>The value in units: <c>-7860</c> at 2 is -78.6.</summary>
    public static decimal Number(int value, int decimals) => new(Math.Abs(value), 0, 0, value < 0, (byte)decimals);

    /// <summary>Writes what <see cref="Text"/> gives, and returns its length.</summary>
    internal static int Write(Span<byte> target, int value, int decimals)
    {
        var length = 0;
        var digits = (uint)Math.Abs((long)value);
        if (value < 0)
        {
            target[length++] = (byte)'-';
        }

        var (whole, fraction) = Math.DivRem(digits, Units[decimals]);
        Utf8Formatter.TryFormat(whole, target[length..], out var written);
        length += written;
        if (decimals > 0)
        {
            target[length++] = (byte)'.';
            for (var place = decimals - 1; place >= 0; place--)
            {
                (fraction, var digit) = Math.DivRem(fraction, 10);
                target[length + place] = (byte)('0' + digit);
            }
        }

        return length + decimals;
    }
}
