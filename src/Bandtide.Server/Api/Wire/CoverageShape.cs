namespace Bandtide.Server.Api;

/// <summary>Who reported when; every list of lists has a row per station and an entry per date.</summary>
/// <param name="From">First date.</param>
/// <param name="To">Last date.</param>
/// <param name="Dates">All dates.</param>
/// <param name="Stations">Codes, ascending.</param>
/// <param name="Hours">Hours with at least one cell; <c>null</c> where nothing was ever sent, 0 where the day was withdrawn.</param>
/// <param name="Cells">Number of cells, likewise.</param>
/// <param name="Bands">Number of bands, likewise.</param>
/// <param name="Revision">Changes whenever the answer could.</param>
public sealed record CoverageShape(
    string From, string To, IReadOnlyList<string> Dates, IReadOnlyList<string> Stations, IReadOnlyList<IReadOnlyList<int?>> Hours,
    IReadOnlyList<IReadOnlyList<int?>> Cells, IReadOnlyList<IReadOnlyList<int?>> Bands, string Revision);
