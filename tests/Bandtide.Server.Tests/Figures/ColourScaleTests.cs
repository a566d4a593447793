using System.Globalization;
using Bandtide.Server.Figures;
using Bandtide.Testing;

namespace Bandtide.Server.Tests.Figures;

public sealed class ColourScaleTests
{
    // Machado, Oliveira and Fernandes (2009), IEEE TVCG 15(6), 1291-1298, full severity, on linear RGB. Matrices from memory.
    private static readonly Dictionary<string, double[,]> Sight = new(StringComparer.Ordinal)
    {
        ["ordinary"] = new[,] { { 1.0, 0, 0 }, { 0, 1, 0 }, { 0, 0, 1 } },
        ["protanopia"] = new[,] { { 0.152286, 1.052583, -0.204868 }, { 0.114503, 0.786281, 0.099216 }, { -0.003882, -0.048116, 1.051998 } },
        ["deuteranopia"] = new[,] { { 0.367322, 0.860646, -0.227968 }, { 0.280085, 0.672501, 0.047413 }, { -0.011820, 0.042940, 0.968881 } },
        ["tritanopia"] = new[,] { { 1.255528, -0.076749, -0.178779 }, { -0.078411, 0.930809, 0.147602 }, { 0.004733, 0.691367, 0.303900 } },
    };

    public static TheoryData<string> Sights => [.. Sight.Keys];

    [Theory]
    [MemberData(nameof(Sights))]
    public void Lightness_falls_at_every_step(string sight)
    {
        var lightness = ColourScale.OnPaper.Select(colour => Lightness(colour, Sight[sight])).ToList();
        Assert.All(Enumerable.Range(1, ColourScale.Steps - 1), step => Assert.True(lightness[step] < lightness[step - 1], $"step {step}"));
        Assert.True(lightness[0] - lightness[^1] > 75, "the scale spans most of black to white");
    }

    [Fact]
    public void Lightness_falls_evenly()
    {
        var lightness = ColourScale.OnPaper.Select(colour => Lightness(colour, Sight["ordinary"])).ToList();
        var even = (lightness[0] - lightness[^1]) / (ColourScale.Steps - 1);
        var eighths = Enumerable.Range(0, 7).Select(i => (lightness[i * 9] - lightness[(i + 1) * 9]) / 9 / even);
        Assert.All(eighths, ratio => Assert.InRange(ratio, 0.6, 1.5));
    }

    [Fact]
    public void The_ends_are_the_published_colours()
    {
        // cmocean "deep", first and last of 256 colours, as 8-bit values.
        Assert.Equal("#fdfecc", ColourScale.OnPaper[0]);
        Assert.Equal("#281a2c", ColourScale.OnPaper[^1]);
    }

    [Fact]
    public void Marks_on_any_colour_have_three_to_one_contrast() => Assert.All(Enumerable.Range(0, ColourScale.Steps), step =>
    {
        // WCAG 2.2, 1.4.11 non-text contrast.
        Assert.True(Contrast(ColourScale.OnPaper[step], ColourScale.IsHigh(step) ? Ink.Paper : Ink.Black) >= 3, $"step {step}");
        Assert.True(Contrast(ColourScale.OnDark[step], ColourScale.IsHigh(step) ? Ink.Black : Ink.Paper) >= 3, $"step {step} on dark");
    });

    [Fact]
    public void The_style_sheet_gives_dark_pages_the_same_colours_in_reverse()
    {
        var sheet = File.ReadAllText(Path.Combine(Repository.Root, "wwwroot", "css", "scale.css"));
        Assert.All(Enumerable.Range(0, ColourScale.Steps), step =>
            Assert.Contains($".s{step} {{ fill: {ColourScale.OnDark[step]}; }}", sheet, StringComparison.Ordinal));
    }

    private static double Contrast(string one, string other)
    {
        var (a, b) = (Luminance(one, Sight["ordinary"]), Luminance(other, Sight["ordinary"]));
        return (Math.Max(a, b) + 0.05) / (Math.Min(a, b) + 0.05);
    }

    // CIE 1976 lightness of sRGB under D65.
    private static double Lightness(string colour, double[,] sight)
    {
        var y = Math.Max(0, Luminance(colour, sight));
        return y > 216.0 / 24389 ? 116 * Math.Cbrt(y) - 16 : y * 24389 / 27;
    }

    // Relative luminance (IEC 61966-2-1).
    private static double Luminance(string colour, double[,] sight)
    {
        var linear = Enumerable.Range(0, 3)
            .Select(i => int.Parse(colour.AsSpan(1 + 2 * i, 2), NumberStyles.HexNumber, CultureInfo.InvariantCulture) / 255.0)
            .Select(c => c <= 0.04045 ? c / 12.92 : Math.Pow((c + 0.055) / 1.055, 2.4))
            .ToArray();
        var seen = Enumerable.Range(0, 3).Select(i => Enumerable.Range(0, 3).Sum(j => sight[i, j] * linear[j])).ToArray();
        return 0.2126 * seen[0] + 0.7152 * seen[1] + 0.0722 * seen[2];
    }
}
