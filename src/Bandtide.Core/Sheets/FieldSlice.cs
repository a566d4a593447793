namespace Bandtide.Core.Sheets;

/// <summary>Where the text of a field stands; a negative length means that it is absent.</summary>
internal readonly record struct FieldSlice(int Start, int Length)
{
    public static FieldSlice Absent { get; } = new(0, -1);

    public ReadOnlySpan<byte> Of(ReadOnlySpan<byte> text) => Length <= 0 ? default : text.Slice(Start, Length);
}
