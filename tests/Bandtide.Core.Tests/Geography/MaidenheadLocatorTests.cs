using Bandtide.Core.Geography;
using Bandtide.Testing;
using CsCheck;

namespace Bandtide.Core.Tests.Geography;

/// <summary>Against the definition and published examples (Tyson, QST, January 1989); see the README of the reference files.</summary>
public sealed class MaidenheadLocatorTests
{
    private static readonly Gen<int> Length = Gen.Int[1, 4].Select(pairs => 2 * pairs);

    [Fact]
    public void Points_get_the_published_locators() => Assert.All(ReferenceTable.Load("maidenhead_encode.csv"), row =>
    {
        var point = new GeoPoint(row.Number("lat_deg"), row.Number("lon_deg"));
        Assert.Equal(row.Text("locator4")[..2], MaidenheadLocator.FromPoint(point, 2).ToString());
        Assert.Equal(row.Text("locator4"), MaidenheadLocator.FromPoint(point, 4).ToString());
        Assert.Equal(row.Text("locator6"), MaidenheadLocator.FromPoint(point, 6).ToString());
        Assert.Equal(row.Text("locator8"), MaidenheadLocator.FromPoint(point, 8).ToString());
    });

    [Fact]
    public void Texts_get_the_published_bounds_or_are_refused() => Assert.All(ReferenceTable.Load("maidenhead_decode.csv"), row =>
    {
        var text = row.Text("locator");
        Assert.Equal(string.Equals(row.Text("valid"), "true", StringComparison.Ordinal), MaidenheadLocator.TryParse(text, out var cell));
        if (row.NumberOrNull("south_lat") is not { } south)
        {
            Assert.Contains($"'{text}'", Assert.Throws<FormatException>(() => MaidenheadLocator.Parse(text)).Message, StringComparison.Ordinal);
            return;
        }

        const double tolerance = 1e-8;
        Assert.Equal(south, cell.South, tolerance);
        Assert.Equal(row.Number("west_lon"), cell.West, tolerance);
        Assert.Equal(row.Number("north_lat"), cell.North, tolerance);
        Assert.Equal(row.Number("east_lon"), cell.East, tolerance);
        Assert.Equal(row.Number("centre_lat"), cell.Centre.LatitudeDegrees, tolerance);
        Assert.Equal(row.Number("centre_lon"), cell.Centre.LongitudeDegrees, tolerance);
    });

    [Fact]
    public void A_point_lies_in_its_cell() => Gen.Select(Samples.Point, Length).Sample(LiesInItsCell);

    // Points on edges, and one step of a double off them, where scaling rounds.
    [Fact]
    public void A_point_on_an_edge_belongs_to_the_cell_north_east_of_it() =>
        Gen.Select(Gen.Int[0, 43200], Gen.Int[0, 43200], Gen.Int[-1, 1], Length).Sample((column, row, nudge, length) =>
            LiesInItsCell(new(Nudged(row / 240.0 - 90, nudge, 90), Nudged(column / 120.0 - 180, nudge, 180)), length));

    [Fact]
    public void Text_leads_back_to_the_cell_and_so_does_its_centre() =>
        Gen.Select(Samples.Point, Length).Sample((point, length) =>
        {
            var cell = MaidenheadLocator.FromPoint(point, length);
            return MaidenheadLocator.Parse(cell.ToString()) == cell
                && MaidenheadLocator.Parse($" {cell.ToString().ToUpperInvariant()}\t") == cell
                && MaidenheadLocator.Parse(cell.ToString().ToLowerInvariant()) == cell
                && MaidenheadLocator.FromPoint(cell.Centre, length) == cell
                && cell.ToString().Length == length && cell.Length == length;
        });

    [Fact]
    public void A_longer_locator_begins_with_the_shorter_ones() =>
        Samples.Point.Sample(point =>
        {
            var fine = MaidenheadLocator.FromPoint(point, 8);
            return new[] { 2, 4, 6, 8 }.All(length =>
                fine.Truncate(length) == MaidenheadLocator.FromPoint(point, length)
                && fine.ToString().StartsWith(fine.Truncate(length).ToString(), StringComparison.Ordinal)
                && fine.Truncate(length).Contains(fine) && fine.Truncate(length).Contains(point));
        });

    [Fact]
    public void A_field_has_no_square_of_its_own_and_holds_its_squares()
    {
        var field = MaidenheadLocator.Parse("KO");
        Assert.Null(field.Square);
        Assert.Equal(field, MaidenheadLocator.Parse("KO33ab").Field);
        Assert.Equal(MaidenheadLocator.Parse("KO33"), MaidenheadLocator.Parse("KO33ab").Square);
        Assert.True(field.Contains(MaidenheadLocator.Parse("KO33")));
        Assert.False(field.Contains(MaidenheadLocator.Parse("JO33")));
        Assert.False(MaidenheadLocator.Parse("KO33").Contains(field));
    }

    [Fact]
    public void The_default_is_a_real_square() => Assert.Equal("AA00", default(MaidenheadLocator).ToString());

    [Theory]
    [InlineData(0)]
    [InlineData(3)]
    [InlineData(10)]
    public void There_is_no_such_length(int length) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => MaidenheadLocator.FromPoint(default, length));

    private static bool LiesInItsCell(GeoPoint point, int length)
    {
        var cell = MaidenheadLocator.FromPoint(point, length);
        var longitude = point.LongitudeDegrees == 180 ? -180 : point.LongitudeDegrees;
        return cell.South <= point.LatitudeDegrees && (point.LatitudeDegrees < cell.North || point.LatitudeDegrees == 90)
            && cell.West <= longitude && longitude < cell.East;
    }

    private static double Nudged(double value, int steps, double limit) => steps switch
    {
        < 0 => Math.Max(-limit, Math.BitDecrement(value)),
        > 0 => Math.Min(limit, Math.BitIncrement(value)),
        _ => value,
    };
}
