using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;

namespace Bandtide.Storage.Heatmaps;

/// <summary>A heatmap with everything a reader must know about it.</summary>
/// <param name="Query">The question.</param>
/// <param name="Heatmap">The cells.</param>
/// <param name="Unit">Unit of the values: <c>1</c> for shares, <c>dB</c>, or the stations' level unit.</param>
/// <param name="Stations">Stations of the selection with data in it.</param>
/// <param name="StationDays">Station-days of the best covered cell.</param>
/// <param name="Revision">Opaque: changes whenever the answer could.</param>
/// <param name="NotComparable">Why levels of these stations cannot be compared with each other, or <c>null</c> when they can.</param>
/// <param name="Note">Why there is nothing, a meaningless season, fewer than three stations, or <c>null</c>.</param>
public sealed record HeatmapAnswer(
    HeatmapQuery Query,
    Heatmap Heatmap,
    string Unit,
    IReadOnlyList<Station> Stations,
    int StationDays,
    string Revision,
    string? NotComparable,
    string? Note);
