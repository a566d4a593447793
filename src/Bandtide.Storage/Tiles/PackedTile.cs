using Bandtide.Core.Heatmaps;

namespace Bandtide.Storage.Tiles;

/// <summary>A tile as stored.</summary>
/// <param name="Month">12 x year + month - 1.</param>
/// <param name="Measure">The measure.</param>
/// <param name="Bytes">The packed tile.</param>
internal sealed record PackedTile(int Month, Measure Measure, byte[] Bytes);
