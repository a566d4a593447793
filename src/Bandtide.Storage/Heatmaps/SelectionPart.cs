using Bandtide.Core.Stations;
using Bandtide.Core.Time;

namespace Bandtide.Storage.Heatmaps;

/// <summary>Stations of a selection that follow the same seasons, and their months.</summary>
/// <param name="Stations">By ascending code.</param>
/// <param name="Months">Ascending; only months that anyone in the network has data for.</param>
internal sealed record SelectionPart(IReadOnlyList<Station> Stations, IReadOnlyList<YearMonth> Months);
