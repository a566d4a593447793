using System.Globalization;
using Bandtide.Core.Sheets;
using Bandtide.Core.Time;
using Bandtide.Storage.Engine;

namespace Bandtide.Storage.Days;

/// <summary>Unpacks stored sheets.</summary>
internal static class StoredSheets
{
    private static readonly Quantity[] All = Enum.GetValues<Quantity>();

    /// <summary>The cells of a stored sheet.</summary>
    /// <exception cref="InvalidDataException">The bytes are damaged; the message names station and date.</exception>
    public static CellGrid Decode(int stationId, int date, byte[] bytes) => Decode(stationId, date, bytes, All);

    /// <summary>Some quantities of a stored sheet's cells; sweeps and occupancy are there always.</summary>
    /// <exception cref="InvalidDataException">The bytes are damaged; the message names station and date.</exception>
    public static CellGrid Decode(int stationId, int date, byte[] bytes, ReadOnlySpan<Quantity> quantities)
    {
        try
        {
            return SheetCodec.Decode(bytes, quantities);
        }
        catch (SheetCorruptException exception)
        {
            throw new InvalidDataException(
                string.Create(CultureInfo.InvariantCulture,
                    $"The stored sheet of station {stationId}, {DateText.Format(EpochDay.ToDate(date))} is damaged: {exception.Message}"),
                exception);
        }
    }
}
