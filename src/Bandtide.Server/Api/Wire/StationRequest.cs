namespace Bandtide.Server.Api;

/// <summary>A station to register.</summary>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Name">Its name for people.</param>
/// <param name="Latitude">North positive, degrees. Kept private.</param>
/// <param name="Longitude">East positive, degrees. Kept private.</param>
/// <param name="LevelUnit"><c>dBm</c>, <c>dBuV</c>, <c>dBuV/m</c> or <c>dBFS</c>.</param>
/// <param name="Regions">Lists to put it on; <c>itu-1</c> to <c>itu-3</c> declares its ITU Region.</param>
public sealed record StationRequest(
    string? Code, string? Name, double? Latitude, double? Longitude, string? LevelUnit, IReadOnlyList<string>? Regions = null);
