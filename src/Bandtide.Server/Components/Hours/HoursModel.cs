using Bandtide.Core.Time;
using Bandtide.Server.Figures;
using Bandtide.Storage.Heatmaps;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components.Hours;

/// <summary>Everything the Hours page shows.</summary>
/// <param name="Address">The address it was read for.</param>
/// <param name="Network">Stations and regions to choose from.</param>
/// <param name="PlaceName">Name of the station or region.</param>
/// <param name="Answer">The answer, or <c>null</c> where the question cannot be answered or is about a year.</param>
/// <param name="Figure">The answer's picture.</param>
/// <param name="Year">The twelve months, where they are asked for.</param>
/// <param name="Problems">Why there is no answer.</param>
internal sealed record HoursModel(
    HoursAddress Address,
    NetworkView Network,
    string PlaceName,
    HeatmapAnswer? Answer,
    HeatmapFigure? Figure,
    YearFigure? Year,
    IReadOnlyList<string> Problems);
