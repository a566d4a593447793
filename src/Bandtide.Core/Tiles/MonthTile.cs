using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Tiles;

/// <summary>
/// One station, month and measure: per hour and band the number of days and the exact sum of their values.
/// </summary>
/// <remarks>
/// Hour-major like the sheets, index <c>hour * BandCount + band</c>, UTC hours. Sums are whole numbers of the measure's
/// stored resolution (1e-4 or 0.01 dB), at most 31 x 60,000, so that no order of summing and no number of months
/// can make a difference. Spread between days is read from the sheets where it is wanted.
/// </remarks>
public sealed class MonthTile
{
    private readonly short[] bandIds;
    private readonly byte[] days;
    private readonly int[] sums;

    /// <summary>Takes over its arrays.</summary>
    /// <param name="bandIds">Ascending.</param>
    /// <param name="days">Days per cell, 0 to 31, 24 x bands.</param>
    /// <param name="sums">Sum over the days, 24 x bands; 0 where there is no day.</param>
    /// <exception cref="ArgumentException">Lengths do not fit.</exception>
    public MonthTile(short[] bandIds, byte[] days, int[] sums)
    {
        ArgumentNullException.ThrowIfNull(bandIds);
        ArgumentNullException.ThrowIfNull(days);
        ArgumentNullException.ThrowIfNull(sums);
        if (days.Length != bandIds.Length * 24 || sums.Length != days.Length)
        {
            throw new ArgumentException("Planes must be 24 x bands long.", nameof(days));
        }

        (this.bandIds, this.days, this.sums) = (bandIds, days, sums);
    }

    /// <summary>Identities of the bands, ascending.</summary>
    public ReadOnlySpan<short> BandIds => bandIds;

    /// <summary>Number of bands.</summary>
    public int BandCount => bandIds.Length;

    /// <summary>Days per cell.</summary>
    public ReadOnlySpan<byte> Days => days;

    /// <summary>Sums per cell.</summary>
    public ReadOnlySpan<int> Sums => sums;

    /// <summary>Sums a month's sheets.</summary>
    /// <param name="measure">The measure.</param>
    /// <param name="sheets">At most 31, of one month, in any order.</param>
    /// <returns>The tile over the bands that have the measure, or <c>null</c> when no cell has it.</returns>
    public static MonthTile? FromSheets(Measure measure, IReadOnlyCollection<CellGrid> sheets)
    {
        ArgumentNullException.ThrowIfNull(sheets);
        var builder = new MonthTileBuilder(sheets);
        int[] scratch = [];
        foreach (var sheet in sheets)
        {
            var size = sheet.BandCount * CellGrid.Hours;
            if (measure.Info().IsDifference && scratch.Length < size)
            {
                scratch = new int[size];
            }

            var values = Measures.Values(sheet, measure, scratch);
            if (!values.IsEmpty)
            {
                builder.Add(sheet, values);
            }
        }

        return builder.Build();
    }
}
