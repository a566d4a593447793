using System.Text.Json.Serialization;

namespace Bandtide.Server.Api;

/// <summary>A heatmap as JSON; every list of lists has a row per band and 24 entries per row, <c>null</c> where there is none.</summary>
/// <param name="Measure">The measure.</param>
/// <param name="Unit"><c>1</c> for shares, <c>dB</c>, or the stations' level unit.</param>
/// <param name="Stat">The statistic.</param>
/// <param name="Clock">The clock of the hours.</param>
/// <param name="Hours">0 to 23.</param>
/// <param name="Bands">Codes in ascending frequency.</param>
/// <param name="Values">The values.</param>
/// <param name="Stations">Stations that reported the measure in the cell.</param>
/// <param name="Days">Station-days that reported the measure in the cell.</param>
/// <param name="Lower">Lower end of the 95 % interval of the mean.</param>
/// <param name="Upper">Upper end of the 95 % interval of the mean.</param>
/// <param name="Revision">Changes whenever the answer could.</param>
/// <param name="Comparable"><c>false</c> where levels of these stations must not be compared; left out otherwise.</param>
/// <param name="Reason">Why they must not; left out otherwise.</param>
/// <param name="Note">What a reader should know: why there is nothing, a season without meaning, few stations; left out otherwise.</param>
public sealed record HeatmapShape(
    string Measure, string Unit, string Stat, string Clock, IReadOnlyList<int> Hours, IReadOnlyList<string> Bands,
    IReadOnlyList<IReadOnlyList<double?>> Values, IReadOnlyList<IReadOnlyList<int>> Stations, IReadOnlyList<IReadOnlyList<int>> Days,
    IReadOnlyList<IReadOnlyList<double?>> Lower, IReadOnlyList<IReadOnlyList<double?>> Upper, string Revision,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] bool? Comparable = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Reason = null,
    [property: JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)] string? Note = null);
