namespace Bandtide.Server.Figures;

/// <summary>The sequential colours of all pictures of quantity: pale for the lowest value on paper, deep ink for the highest.</summary>
/// <remarks>
/// Nine colours of cmocean's "deep", made for depth charts and even in lightness, interpolated in sRGB. Source: Thyng, Greene,
/// Hetland, Zimmerle and DiMarco (2016), True colors of oceanography, Oceanography 29(3), 9-13; MIT licence. On a dark page
/// the scale runs the other way, so that the lowest value always lies nearest to the paper. Lightness falls at every step for
/// ordinary and for colour-blind sight alike. What is shown is rounded to <see cref="Steps"/> colours, so that a page can
/// theme them by class.
/// </remarks>
internal static class ColourScale
{
    /// <summary>Number of colours.</summary>
    public const int Steps = 64;

    private static readonly (double Place, int Red, int Green, int Blue)[] Anchors =
    [
        (0, 253, 254, 204), (0.12, 187, 230, 172), (0.25, 120, 206, 163), (0.37, 85, 174, 163), (0.5, 72, 142, 158),
        (0.62, 63, 110, 151), (0.75, 64, 76, 139), (0.87, 59, 49, 90), (1, 40, 26, 44),
    ];

    /// <summary>The colours on paper as <c>#rrggbb</c>, from lowest to highest value.</summary>
    public static IReadOnlyList<string> OnPaper { get; } = [.. Enumerable.Range(0, Steps).Select(step => Interpolate(step / (Steps - 1.0)))];

    /// <summary>The colours on a dark page as <c>#rrggbb</c>, from lowest to highest value.</summary>
    public static IReadOnlyList<string> OnDark { get; } = [.. OnPaper.Reverse()];

    /// <summary>The colour's number for a place on the scale, 0 lowest to 1 highest; what lies outside is clamped.</summary>
    public static int Step(double place) => (int)Math.Round(Math.Clamp(place, 0, 1) * (Steps - 1), MidpointRounding.AwayFromZero);

    /// <summary>Whether a mark on this colour has to be light on paper and dark on a dark page; otherwise the other way round.</summary>
    public static bool IsHigh(int step) => step >= 28;

    private static string Interpolate(double place)
    {
        var upper = Array.FindIndex(Anchors, 1, anchor => anchor.Place >= place);
        var (from, to) = (Anchors[upper - 1], Anchors[upper]);
        var share = (place - from.Place) / (to.Place - from.Place);
        int Mix(int a, int b) => (int)Math.Round(a + share * (b - a), MidpointRounding.AwayFromZero);
        return $"#{Mix(from.Red, to.Red):x2}{Mix(from.Green, to.Green):x2}{Mix(from.Blue, to.Blue):x2}";
    }
}
