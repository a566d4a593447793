using Bandtide.Core.Stations;
using Bandtide.Server.Figures;
using Bandtide.Storage.Coverage;
using Bandtide.Storage.Days;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components.Overview;

/// <summary>Everything a station's page shows.</summary>
/// <param name="Station">The station.</param>
/// <param name="Regions">The regions it belongs to.</param>
/// <param name="DayCount">Number of current days.</param>
/// <param name="FirstDay">The oldest day, or <c>null</c> without any.</param>
/// <param name="Recent">The newest days, newest first.</param>
/// <param name="Coverage">Whole years from the first to the last, or <c>null</c> without days.</param>
/// <param name="Figure">The newest month, or <c>null</c> without days.</param>
/// <param name="FigureAddress">Where that month is on the Hours page.</param>
/// <param name="HistoryDay">The day whose revisions are shown, if asked for.</param>
/// <param name="History">Its revisions, newest first.</param>
internal sealed record StationModel(
    Station Station,
    IReadOnlyList<Region> Regions,
    int DayCount,
    DateOnly? FirstDay,
    IReadOnlyList<StoredDay> Recent,
    CoverageAnswer? Coverage,
    HeatmapFigure? Figure,
    string FigureAddress,
    DateOnly? HistoryDay,
    IReadOnlyList<StoredDay> History);
