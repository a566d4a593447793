namespace Bandtide.Server.Api;

/// <summary>One segment of a band, half-open.</summary>
/// <param name="LowKhz">Lower limit, kHz, part of the band.</param>
/// <param name="HighKhz">Upper limit, kHz, not part of it.</param>
public sealed record SegmentAnswer(double LowKhz, double HighKhz);
