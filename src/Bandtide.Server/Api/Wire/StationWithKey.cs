namespace Bandtide.Server.Api;

/// <summary>A new station with its key, which is shown this once.</summary>
/// <param name="Station">The station.</param>
/// <param name="Key">Its key.</param>
public sealed record StationWithKey(StationAnswer Station, string Key);
