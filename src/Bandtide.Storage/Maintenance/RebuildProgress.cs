namespace Bandtide.Storage.Maintenance;

/// <summary>How far a rebuild has come.</summary>
/// <param name="StationsDone">Stations whose tiles are new.</param>
/// <param name="Stations">All stations.</param>
/// <param name="Months">Station-months recomputed so far.</param>
public sealed record RebuildProgress(int StationsDone, int Stations, int Months);
