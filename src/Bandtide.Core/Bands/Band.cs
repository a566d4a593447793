using System.Collections.Immutable;

namespace Bandtide.Core.Bands;

/// <summary>A frequency range with a code, made of one or more segments.</summary>
/// <param name="Id">Identity kept in stored sheets; never reused for another band.</param>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Layer">Layer it belongs to.</param>
/// <param name="Name">Name in words, without frequencies.</param>
/// <param name="Segments">Segments in ascending frequency.</param>
public sealed record Band(short Id, string Code, BandLayer Layer, string Name, ImmutableArray<FrequencySegment> Segments)
{
    /// <summary>Lowest edge in Hz, part of the band.</summary>
    public int LowHz => Segments[0].LowHz;

    /// <summary>Highest edge in Hz, not part of the band.</summary>
    public int HighHz => Segments[^1].HighHz;

    /// <summary>Sum of the segments' widths in Hz.</summary>
    public int WidthHz => Segments.Sum(segment => segment.WidthHz);

    /// <summary>Name and limits, such as <c>31 m broadcasting, 9400–9900 kHz</c>; every segment is named.</summary>
    public string Label => $"{Name}, {string.Join(" and ", Segments)} kHz";

    /// <summary>Lowest and highest edge alone, such as <c>9400–9900 kHz</c>: for axes. A gap between segments is not shown.</summary>
    public string ShortLabel => $"{new FrequencySegment(LowHz, HighHz)} kHz";

    /// <summary>Whether a frequency in Hz lies in one of the segments.</summary>
    public bool Contains(double hz)
    {
        foreach (var segment in Segments)
        {
            if (segment.Contains(hz))
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Equal in every part, the segments compared one by one.</summary>
    public bool Equals(Band? other) =>
        other is not null && Id == other.Id && Layer == other.Layer
        && string.Equals(Code, other.Code, StringComparison.Ordinal) && string.Equals(Name, other.Name, StringComparison.Ordinal)
        && Segments.AsSpan().SequenceEqual(other.Segments.AsSpan());

    /// <inheritdoc/>
    public override int GetHashCode() => HashCode.Combine(Id, Code.GetHashCode(StringComparison.Ordinal));
}
