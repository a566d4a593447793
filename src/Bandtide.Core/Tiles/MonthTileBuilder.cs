using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Tiles;

/// <summary>Sums the sheets of one month over all bands of any of them.</summary>
internal sealed class MonthTileBuilder
{
    private readonly short[] bandIds;
    private readonly int[] days;
    private readonly int[] sums;

    public MonthTileBuilder(IReadOnlyCollection<CellGrid> sheets)
    {
        bandIds = [];
        foreach (var sheet in sheets)
        {
            if (!sheet.BandIds.SequenceEqual(bandIds))
            {
                bandIds = [.. bandIds.Union(sheet.BandIds.ToArray()).Order()];
            }
        }

        days = new int[CellGrid.Hours * bandIds.Length];
        sums = new int[days.Length];
    }

    /// <summary>Adds one sheet's values of a measure, as long as its planes.</summary>
    public void Add(CellGrid sheet, ReadOnlySpan<int> values)
    {
        if (sheet.BandCount == bandIds.Length)
        {
            DayKernel.AddDay(values, days, sums);
            return;
        }

        var runs = BandRun.Between(sheet.BandIds, bandIds);
        for (var hour = 0; hour < CellGrid.Hours; hour++)
        {
            foreach (var run in runs)
            {
                var target = hour * bandIds.Length + run.Target;
                DayKernel.AddDay(
                    values.Slice(hour * sheet.BandCount + run.Source, run.Length), days.AsSpan(target, run.Length), sums.AsSpan(target, run.Length));
            }
        }
    }

    /// <summary>The tile over the bands that have a value, or <c>null</c> when none has.</summary>
    public MonthTile? Build()
    {
        var columns = Enumerable.Range(0, bandIds.Length)
            .Where(band => Enumerable.Range(0, CellGrid.Hours).Any(hour => days[hour * bandIds.Length + band] > 0)).ToArray();
        if (columns.Length == 0)
        {
            return null;
        }

        var keptDays = new byte[CellGrid.Hours * columns.Length];
        var keptSums = new int[keptDays.Length];
        for (var i = 0; i < keptDays.Length; i++)
        {
            var from = i / columns.Length * bandIds.Length + columns[i % columns.Length];
            (keptDays[i], keptSums[i]) = ((byte)days[from], sums[from]);
        }

        return new([.. columns.Select(column => bandIds[column])], keptDays, keptSums);
    }
}
