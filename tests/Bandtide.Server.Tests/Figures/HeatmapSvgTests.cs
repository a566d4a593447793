using System.Xml.Linq;
using Bandtide.Core.Heatmaps;
using Bandtide.Server.Figures;

namespace Bandtide.Server.Tests.Figures;

public sealed class HeatmapSvgTests
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    [Fact]
    public void The_picture_is_well_formed_and_carries_its_words()
    {
        var picture = Parse(FigureSamples.StationMonth, FigureSamples.Plausible, "Tom & <Jerry>'s hut");

        Assert.Equal("Occupancy, mean: Tom & <Jerry>'s hut, June 2026", picture.Element(Svg + "title")!.Value);
        var texts = picture.Descendants(Svg + "text").Select(text => text.Value).ToList();
        Assert.Contains("31 m broadcasting", texts);
        Assert.Contains("9400–9900", texts.Select(text => text.Replace(" kHz", "", StringComparison.Ordinal)));
        Assert.Contains("00", texts);
        Assert.Contains("23", texts);
        Assert.Contains("not observed", texts);
        Assert.Contains("Occupancy, %", texts);
    }

    [Fact]
    public void Not_observed_zero_and_few_data_look_different()
    {
        HeatmapCell Cell(int band, int hour) => hour switch
        {
            0 => new(double.NaN, double.NaN, double.NaN, 0, 0),
            1 => new(0, 0, 0.01, 1, 30),
            2 => new(0.5, 0.3, 0.7, 1, 4),
            _ => new(0.5, 0.4, 0.6, 1, 5),
        };

        var picture = Parse(FigureSamples.StationMonth, Cell, "Helsinki");
        var rows = FigureSamples.Answer(FigureSamples.StationMonth, Cell).Heatmap.Bands.Count;

        // Hour 0 of every row is hatched and has no colour.
        var hatched = ByClass(picture, "rect", "fig-unobserved").ToList();
        Assert.Equal(rows, hatched.Count);
        Assert.All(hatched, rect => Assert.Equal(("0%", "url(#hatch-alone)"), ((string)rect.Attribute("x")!, (string)rect.Attribute("fill")!)));
        Assert.Equal(23 * rows, Bricks(picture).Values.Sum());

        // Hour 1 has the lowest colour, no hatching and no dot; hour 2 a dot; the others neither.
        Assert.Equal(rows, Bricks(picture)[ColourScale.OnPaper[0]]);
        var inCells = ByClass(picture, "g", "fig-cells").Single();
        var dots = inCells.Elements(Svg + "circle").ToList();
        Assert.Equal(rows, dots.Count);
        Assert.All(dots, dot => Assert.Equal("10.417%", (string)dot.Attribute("cx")!));
    }

    [Fact]
    public void A_spread_of_one_is_a_dot_without_colour_and_not_hatched()
    {
        var query = FigureSamples.StationMonth with { Statistic = Statistic.Sd };
        var picture = Parse(query, (_, _) => new(double.NaN, double.NaN, double.NaN, 1, 1), "Helsinki");

        Assert.Empty(ByClass(picture, "rect", "fig-unobserved"));
        Assert.Empty(Bricks(picture));
        Assert.NotEmpty(picture.Descendants(Svg + "circle"));
    }

    [Fact]
    public void The_highest_band_stands_on_top()
    {
        var names = ByClass(Parse(FigureSamples.StationMonth, FigureSamples.Plausible, "Helsinki"), "text", "fig-name").Select(text => text.Value).ToList();
        Assert.Equal("10 m amateur", names[0]);
        Assert.Equal("Long-wave broadcasting", names[^1]);
    }

    [Fact]
    public void An_answer_without_bands_is_a_picture_of_its_reason()
    {
        var answer = new Storage.Heatmaps.HeatmapAnswer(
            FigureSamples.StationMonth, new Heatmap([], []), "1", [], 0, "r", null, "No day of June 2026 was sent.");
        var picture = XDocument.Parse(HeatmapSvg.Render(HeatmapFigure.Of(answer, "Helsinki"))).Root!;
        Assert.Contains("No day of June 2026 was sent.", picture.Descendants(Svg + "text").Select(text => text.Value));
    }

    [Fact]
    public void Every_colour_of_a_page_picture_can_be_themed_by_its_class()
    {
        var figure = HeatmapFigure.Of(FigureSamples.Answer(FigureSamples.StationMonth, FigureSamples.Plausible), "Helsinki");
        var picture = XDocument.Parse($"<page>{HeatmapSvg.RenderInline(figure, "x")}</page>").Root!;
        var coloured = picture.Descendants()
            .Where(element => element.Attribute("fill") is { Value: not "none" } || element.Attribute("stroke") is not null)
            .Where(element => element.Attribute("fill")?.Value.StartsWith("url(", StringComparison.Ordinal) is not true);
        Assert.All(coloured, element => Assert.NotNull(element.Attribute("class")));
    }

    private static XElement Parse(HeatmapQuery query, Func<int, int, HeatmapCell> cell, string place) =>
        XDocument.Parse(HeatmapSvg.Render(HeatmapFigure.Of(FigureSamples.Answer(query, cell), place))).Root!;

    private static IEnumerable<XElement> ByClass(XElement picture, string name, string kind) =>
        picture.Descendants(Svg + name).Where(element => string.Equals((string?)element.Attribute("class"), kind, StringComparison.Ordinal));

    // Number of cells by colour.
    private static Dictionary<string, int> Bricks(XElement picture) => ByClass(picture, "g", "fig-cells").Single()
        .Descendants(Svg + "path")
        .ToDictionary(path => (string)path.Attribute("fill")!, path => ((string)path.Attribute("d")!).Count(c => c == 'M'));
}
