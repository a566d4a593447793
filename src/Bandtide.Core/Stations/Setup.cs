namespace Bandtide.Core.Stations;

/// <summary>What was connected at a station and how it measured, valid from a UTC date until the next setup.</summary>
/// <param name="ValidFrom">First UTC date.</param>
/// <param name="Threshold"><c>fixed</c> or <c>floor+margin</c>; <c>null</c> when not told.</param>
/// <param name="MarginDb">Margin of the threshold above the floor, dB.</param>
/// <param name="Averages">Spectra averaged in one sweep.</param>
/// <param name="Detector">How a level is formed.</param>
/// <param name="ResolutionHz">Width of a frequency bin, Hz.</param>
/// <param name="NoiseBandwidthHz">Equivalent noise bandwidth of a bin, Hz.</param>
/// <param name="RevisitSeconds">Time from one sweep to the next, s.</param>
/// <param name="AntennaFactorDb">Antenna factor, dB/m.</param>
/// <param name="Environment">Class of man-made noise of ITU-R P.372: <c>city</c>, <c>residential</c>, <c>rural</c> or <c>quiet-rural</c>.</param>
/// <param name="Receiver">Free text.</param>
/// <param name="Antenna">Free text.</param>
/// <param name="Note">Free text.</param>
public sealed record Setup(
    DateOnly ValidFrom,
    string? Threshold = null,
    double? MarginDb = null,
    int? Averages = null,
    Detector? Detector = null,
    double? ResolutionHz = null,
    double? NoiseBandwidthHz = null,
    double? RevisitSeconds = null,
    double? AntennaFactorDb = null,
    string? Environment = null,
    string? Receiver = null,
    string? Antenna = null,
    string? Note = null);
