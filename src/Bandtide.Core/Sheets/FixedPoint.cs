using System.Globalization;

namespace Bandtide.Core.Sheets;

/// <summary>Stored whole numbers as decimal text.</summary>
public static class FixedPoint
{
    /// <summary>A value in its stored resolution, with all its decimal places: <c>-7860</c> at 2 is <c>-78.60</c>.</summary>
    public static string Text(int value, int decimals) =>
        new decimal(Math.Abs(value), 0, 0, value < 0, (byte)decimals).ToString(CultureInfo.InvariantCulture);

    /// <summary>The value in units: <c>-7860</c> at 2 is -78.6.</summary>
    public static decimal Number(int value, int decimals) => new(Math.Abs(value), 0, 0, value < 0, (byte)decimals);
}
