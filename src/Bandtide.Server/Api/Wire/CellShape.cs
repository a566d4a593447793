namespace Bandtide.Server.Api;

/// <summary>One cell, for the API's description.</summary>
/// <param name="Hour">UTC hour, 0 to 23.</param>
/// <param name="Band">Band code.</param>
/// <param name="Sweeps">1 to 1,000,000.</param>
/// <param name="Occupancy">0 to 1.</param>
/// <param name="Signal">Median level of what was above the threshold, dB.</param>
/// <param name="Level">Median of all levels, dB.</param>
/// <param name="LevelP90">90th percentile of all levels, dB, not below <c>level</c>.</param>
/// <param name="Floor">Noise floor, dB.</param>
/// <param name="Steady">Share of bins that look like a local carrier, 0 to 1.</param>
/// <param name="Coverage">Share of the band observed, 0 to 1; absent means all.</param>
public sealed record CellShape(
    int Hour, string Band, int Sweeps, double Occupancy, double? Signal = null, double? Level = null, double? LevelP90 = null, double? Floor = null,
    double? Steady = null, double? Coverage = null);
