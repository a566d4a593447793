using Bandtide.Core.Heatmaps;
using Bandtide.Core.Tiles;
using Bandtide.Core.Time;

namespace Bandtide.Storage.Tiles;

/// <summary>Unpacks stored tiles.</summary>
internal static class StoredTiles
{
    /// <summary>The tile of stored bytes.</summary>
    /// <exception cref="InvalidDataException">The bytes are damaged; the message names station, month and measure.</exception>
    public static MonthTile Decode(int stationId, int month, Measure measure, byte[] bytes)
    {
        try
        {
            return MonthTileCodec.Decode(bytes);
        }
        catch (TileCorruptException exception)
        {
            throw new InvalidDataException(
                $"The stored tile of station {stationId}, {YearMonth.FromNumber(month)}, {measure} is damaged; rebuild makes it anew. {exception.Message}",
                exception);
        }
    }
}
