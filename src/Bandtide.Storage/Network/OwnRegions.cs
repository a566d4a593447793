using System.Globalization;
using Bandtide.Core.Stations;

namespace Bandtide.Storage.Network;

/// <summary>The regions that exist by themselves: everything, the ITU Regions, and Maidenhead fields and squares.</summary>
internal static class OwnRegions
{
    public const string All = "all";
    public const string ItuPrefix = "itu-";
    private const string FieldPrefix = "field-";
    private const string SquarePrefix = "square-";

    /// <summary>Whether a coordinator's region may not have this code.</summary>
    public static bool IsReserved(string code) => string.Equals(code, All, StringComparison.Ordinal)
        || code.StartsWith(ItuPrefix, StringComparison.Ordinal)
        || code.StartsWith(FieldPrefix, StringComparison.Ordinal)
        || code.StartsWith(SquarePrefix, StringComparison.Ordinal);

    /// <summary>The number of the ITU Region that a code names, or <c>null</c>.</summary>
    public static int? ItuRegion(string code) => code switch { "itu-1" => 1, "itu-2" => 2, "itu-3" => 3, _ => null };

    /// <summary>An ITU Region without stations, or <c>null</c> for another code.</summary>
    public static Region? EmptyItuRegion(string code) => ItuRegion(code) is { } number ? Itu(number, []) : null;

    /// <summary><c>all</c>, and every other region of this kind that has a station.</summary>
    public static IEnumerable<Region> Of(IReadOnlyList<Station> stations)
    {
        yield return new(All, "All stations", RegionKind.Everything, [], stations);
        foreach (var group in stations.GroupBy(station => station.ItuRegion))
        {
            yield return Itu(group.Key, [.. group]);
        }

        foreach (var group in stations.GroupBy(station => station.Square.Field))
        {
            var text = group.Key.ToString();
            yield return new(FieldPrefix + Lower(text), $"Field {text}", RegionKind.Field, [text], [.. group]);
        }

        foreach (var group in stations.GroupBy(station => station.Square))
        {
            var text = group.Key.ToString();
            yield return new(SquarePrefix + Lower(text), $"Square {text}", RegionKind.Square, [text], [.. group]);
        }
    }

    private static Region Itu(int number, IReadOnlyList<Station> stations)
    {
        var text = number.ToString(CultureInfo.InvariantCulture);
        return new(ItuPrefix + text, $"ITU Region {text}", RegionKind.ItuRegion, [], stations);
    }

    // Codes are lower case by contract.
    private static string Lower(string text) => text.ToLowerInvariant();
}
