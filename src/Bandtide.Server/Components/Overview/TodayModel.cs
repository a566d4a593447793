using Bandtide.Server.Figures;
using Bandtide.Storage.Coverage;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components.Overview;

/// <summary>Everything the front page shows.</summary>
/// <param name="Network">The network.</param>
/// <param name="Report">Who has reported lately.</param>
/// <param name="Figure">The pooled month of the last complete day, or <c>null</c> without data.</param>
/// <param name="Address">Where that month is on the Hours page.</param>
internal sealed record TodayModel(NetworkView Network, NetworkReport Report, HeatmapFigure? Figure, string Address);
