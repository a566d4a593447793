namespace Bandtide.Core.Bands;

/// <summary>A half-open stretch of spectrum: the low edge belongs to it, the high edge does not.</summary>
/// <remarks><c>default</c> is empty; a band plan refuses it.</remarks>
/// <param name="LowHz">Low edge in Hz, 0 or more.</param>
/// <param name="HighHz">High edge in Hz, above the low edge.</param>
/// <exception cref="ArgumentOutOfRangeException">A negative low edge, or a high edge not above it.</exception>
public readonly record struct FrequencySegment(int LowHz, int HighHz)
{
    /// <summary>Low edge in Hz, part of the segment.</summary>
    public int LowHz { get; } = LowHz >= 0
        ? LowHz
        : throw new ArgumentOutOfRangeException(nameof(LowHz), LowHz, "A frequency is not negative.");

    /// <summary>High edge in Hz, not part of the segment.</summary>
    public int HighHz { get; } = HighHz > LowHz
        ? HighHz
        : throw new ArgumentOutOfRangeException(nameof(HighHz), HighHz, "The high edge must lie above the low edge.");

    /// <summary>Width in Hz.</summary>
    public int WidthHz => HighHz - LowHz;

    /// <summary>Makes a segment of two edges in Hz if 0 ≤ low &lt; high.</summary>
    public static bool TryCreate(int lowHz, int highHz, out FrequencySegment segment)
    {
        var valid = lowHz >= 0 && highHz > lowHz;
        segment = valid ? new(lowHz, highHz) : default;
        return valid;
    }

    /// <summary>Whether a frequency in Hz lies in the segment.</summary>
    public bool Contains(double hz) => hz >= LowHz && hz < HighHz;

    /// <summary>Whether two segments share any frequency.</summary>
    public bool Overlaps(FrequencySegment other) => LowHz < other.HighHz && other.LowHz < HighHz;

    /// <summary>Edges in kHz, such as <c>148.5–283.5</c>.</summary>
    public override string ToString() =>
        string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{LowHz / 1000m:0.###}–{HighHz / 1000m:0.###}");
}
