using Bandtide.Core.Geography;
using Bandtide.Core.Stations;
using static System.FormattableString;

namespace Bandtide.Server.Figures;

/// <summary>Draws stations on the land of the world, each in the middle of its square; longitude and latitude are evenly divided.</summary>
/// <remarks>The land is one path in <c>wwwroot/map/land.svg</c>, kept by the browser; places are per cent, so that dots keep their size.</remarks>
internal static class StationMapSvg
{
    /// <summary>Units of the land's path for a degree.</summary>
    private const double UnitsPerDegree = 2000 / 360.0;

    private const double NorthEdge = 84;
    private const double SouthEdge = -60;
    private const int MostNumbers = 60;
    private const int SquareReach = 14;

    /// <summary>The map of a list of stations; numbers count the list from 1, and every dot is a link to its station.</summary>
    public static string Render(IReadOnlyList<Station> stations)
    {
        ArgumentNullException.ThrowIfNull(stations);
        var (north, south) = stations.Any(station => station.Square.Centre.LatitudeDegrees is < SouthEdge or > NorthEdge)
            ? (90.0, -90.0)
            : (NorthEdge, SouthEdge);
        var svg = new SvgWriter();
        svg.Add($"""<svg class="fig-map" style="aspect-ratio:360/{north - south}" font-size="12">""");
        Land(svg, -180, 180, north, south, 30);
        foreach (var (station, index) in stations.Select((station, index) => (station, index)))
        {
            var place = station.Square.Centre;
            var (x, y) = ((place.LongitudeDegrees + 180) / 3.6, (north - place.LatitudeDegrees) / (north - south) * 100);
            var name = stations.Count <= MostNumbers ? Invariant($"{index + 1} {station.Name}") : station.Name;
            svg.Add($"""<a href="stations/{station.Code}" aria-label="{name}"><circle class="fig-reach" cx="{x}%" cy="{y}%" r="12" fill="transparent"/><circle class="fig-place" cx="{x}%" cy="{y}%" r="4.5" stroke-width="1.5"/>""");
            if (stations.Count <= MostNumbers)
            {
                svg.Add($"""<text class="fig-number" x="{x}%" y="{y}%" dx="7" dy="4">{index + 1}</text>""");
            }

            svg.AddRaw("</a>");
        }

        return svg.AddRaw("</svg>").ToString();
    }

    /// <summary>The surroundings of a square, the square outlined.</summary>
    public static string RenderSquare(MaidenheadLocator square)
    {
        var centre = square.Centre;
        var west = Math.Clamp(centre.LongitudeDegrees - SquareReach * 1.6, -180, 180 - SquareReach * 3.2);
        var north = Math.Clamp(centre.LatitudeDegrees + SquareReach, -90 + SquareReach * 2, 90);
        var (east, south) = (west + SquareReach * 3.2, north - SquareReach * 2);
        var svg = new SvgWriter();
        svg.Add($"""<svg class="fig-map" role="img" aria-label="Square {square} on the map" style="aspect-ratio:{east - west}/{north - south}" font-size="12">""");
        Land(svg, west, east, north, south, 10);
        svg.Add($"""<rect class="fig-square" x="{(square.West - west) / (east - west) * 100}%" y="{(north - square.North) / (north - south) * 100}%" width="{(square.East - square.West) / (east - west) * 100}%" height="{(square.North - square.South) / (north - south) * 100}%" fill="none" stroke-width="2"/>""");
        return svg.AddRaw("</svg>").ToString();
    }

    private static void Land(SvgWriter svg, double west, double east, double north, double south, int every)
    {
        var (width, height) = ((east - west) * UnitsPerDegree, (north - south) * UnitsPerDegree);
        svg.Add($"""<svg viewBox="{(west + 180) * UnitsPerDegree} {(90 - north) * UnitsPerDegree} {width} {height}" width="100%" height="100%" preserveAspectRatio="none"><use class="fig-land" href="map/land.svg#land"/></svg>""");
        for (var longitude = Math.Ceiling(west / every) * every; longitude < east; longitude += every)
        {
            svg.Add($"""<line class="fig-grid" x1="{(longitude - west) / (east - west) * 100}%" x2="{(longitude - west) / (east - west) * 100}%" y1="0" y2="100%" stroke-width="0.5"/>""");
        }

        for (var latitude = Math.Ceiling(south / every) * every; latitude < north; latitude += every)
        {
            svg.Add($"""<line class="fig-grid" y1="{(north - latitude) / (north - south) * 100}%" y2="{(north - latitude) / (north - south) * 100}%" x1="0" x2="100%" stroke-width="0.5"/>""");
        }
    }
}
