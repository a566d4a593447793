using Bandtide.Core.Stations;

namespace Bandtide.Storage.Coverage;

/// <summary>Who has reported lately.</summary>
/// <param name="LastCompleteDate">The newest UTC date before today for which any station reported, or <c>null</c> without data.</param>
/// <param name="Reporters">The stations that reported for it, by ascending code.</param>
/// <param name="Newest">The newest day of every station that ever reported, by ascending code; today's included.</param>
public sealed record NetworkReport(DateOnly? LastCompleteDate, IReadOnlyList<Station> Reporters, IReadOnlyList<StationReport> Newest);
