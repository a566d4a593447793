using Bandtide.Core.Geography;
using Bandtide.Core.Stations;

namespace Bandtide.Storage.Network;

/// <summary>What is needed to register a station.</summary>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Name">The name people use.</param>
/// <param name="Position">Exact position.</param>
/// <param name="Unit">Unit of its decibel values.</param>
/// <param name="Regions">Codes of regions it belongs to: lists to put it on; <c>itu-n</c> declares its ITU Region, which is
/// guessed from the position otherwise.</param>
public sealed record NewStation(string Code, string Name, GeoPoint Position, LevelUnit Unit, IReadOnlyList<string> Regions);
