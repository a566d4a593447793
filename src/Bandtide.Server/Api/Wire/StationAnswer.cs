namespace Bandtide.Server.Api;

/// <summary>A station as everyone may see it.</summary>
/// <param name="Code">Its code.</param>
/// <param name="Name">Its name for people.</param>
/// <param name="Locator">Its Maidenhead square: the only position that is published.</param>
/// <param name="LevelUnit">Unit of its decibel values: <c>dBm</c>, <c>dBuV</c>, <c>dBuV/m</c> or <c>dBFS</c>.</param>
/// <param name="ItuRegion">1 to 3.</param>
/// <param name="Regions">Codes of every region it belongs to.</param>
/// <param name="Setups">By ascending first date.</param>
public sealed record StationAnswer(
    string Code, string Name, string Locator, string LevelUnit, int ItuRegion, IReadOnlyList<string> Regions, IReadOnlyList<SetupShape> Setups);
