namespace Bandtide.Server.Figures;

/// <summary>The colours of a picture on paper, as plain attributes: a picture that stands alone has no style sheet.</summary>
/// <remarks>On a page every part also has a class, by which the style sheet gives it the page's colours, dark ones included.</remarks>
internal static class Ink
{
    /// <summary>The paper.</summary>
    public const string Paper = "#fbfcfa";

    /// <summary>Text and rules.</summary>
    public const string Black = "#1b2230";

    /// <summary>Lesser text.</summary>
    public const string Grey = "#525b6b";

    /// <summary>Lines of the hatching.</summary>
    public const string Hatch = "#a3aab5";

    /// <summary>The second ink: sunrise, sunset and what a reader can follow.</summary>
    public const string Second = "#93185c";

    /// <summary>Daylight in the strip.</summary>
    public const string Day = "#ffffff";

    /// <summary>Night in the strip.</summary>
    public const string Night = "#1b2230";

    /// <summary>Typefaces in order of preference.</summary>
    public const string Typefaces = "'Source Serif 4 Variable','Source Serif 4',Georgia,'Times New Roman',serif";
}
