using Bandtide.Storage.Coverage;
using Bandtide.Storage.Network;

namespace Bandtide.Server.Components.Reports;

/// <summary>Everything the Coverage page shows.</summary>
/// <param name="Address">The address it was read for.</param>
/// <param name="Network">Stations and regions to choose from.</param>
/// <param name="PlaceName">Name of the station or region.</param>
/// <param name="Answer">Who reported when.</param>
internal sealed record CoverageModel(CoverageAddress Address, NetworkView Network, string PlaceName, CoverageAnswer Answer);
