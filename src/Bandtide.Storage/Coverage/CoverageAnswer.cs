using Bandtide.Core.Stations;

namespace Bandtide.Storage.Coverage;

/// <summary>Who reported when: stations by dates.</summary>
/// <param name="Stations">All stations of the selection, by ascending code.</param>
/// <param name="From">First date.</param>
/// <param name="To">Last date, included.</param>
/// <param name="Days">Per station one entry per date from <paramref name="From"/>; <c>null</c> where nothing was ever sent.</param>
/// <param name="Revision">Opaque: changes whenever the answer could.</param>
public sealed record CoverageAnswer(
    IReadOnlyList<Station> Stations, DateOnly From, DateOnly To, IReadOnlyList<IReadOnlyList<CoverageDay?>> Days, string Revision);
