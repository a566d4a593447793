namespace Bandtide.Core.Time;

/// <summary>Meteorological seasons of either hemisphere as calendar months.</summary>
/// <remarks>
/// The season that spans New Year (December to February) takes January's year in both hemispheres: the northern winter
/// and the southern summer of 2026 both begin in December 2025. The three-month groups are common practice in meteorology and
/// climatology; the year's name is this project's convention.
/// </remarks>
public static class Seasons
{
    /// <summary>Latitude, in degrees either side of the equator, under which a season has no meaning of its own.</summary>
    public const double MeaninglessWithinDegrees = 15;

    /// <summary>The three months of a season, in order of time.</summary>
    /// <param name="season">The season as named on the spot.</param>
    /// <param name="year">Year of the season; for December to February the year of January.</param>
    /// <param name="hemisphere">Whose season.</param>
    /// <exception cref="ArgumentOutOfRangeException">A month of the season lies outside the years 1 to 9999.</exception>
    public static IReadOnlyList<YearMonth> Months(Season season, int year, Hemisphere hemisphere)
    {
        // Quarter 0 begins in December of the year before, quarter 1 in March.
        var quarter = hemisphere == Hemisphere.South ? ((int)season + 2) % 4 : (int)season;
        var first = new YearMonth(year, 1).AddMonths(quarter * 3 - 1);
        return [first, first.AddMonths(1), first.AddMonths(2)];
    }

    /// <summary>The season and its year that a month belongs to.</summary>
    public static (Season Season, int Year) Of(YearMonth month, Hemisphere hemisphere)
    {
        var quarter = month.Month % 12 / 3;
        var season = hemisphere == Hemisphere.South ? (quarter + 2) % 4 : quarter;
        return ((Season)season, month.Month == 12 ? month.Year + 1 : month.Year);
    }

    /// <summary>Whose seasons a latitude (degrees, north positive) follows; the equator counts as north.</summary>
    public static Hemisphere HemisphereOf(double latitudeDegrees) =>
        latitudeDegrees < 0 ? Hemisphere.South : Hemisphere.North;

    /// <summary>False within <see cref="MeaninglessWithinDegrees"/> of the equator (both ends included).</summary>
    public static bool IsMeaningful(double latitudeDegrees) => Math.Abs(latitudeDegrees) > MeaninglessWithinDegrees;
}
