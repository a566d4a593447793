using Bandtide.Core.Stations;

namespace Bandtide.Storage.Coverage;

/// <summary>The newest day of a station.</summary>
/// <param name="Station">The station.</param>
/// <param name="Date">Its newest UTC date with a sheet.</param>
/// <param name="ReceivedAt">When the current revision of that day arrived, UTC.</param>
public sealed record StationReport(Station Station, DateOnly Date, DateTimeOffset ReceivedAt);
