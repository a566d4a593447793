using System.Buffers;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Time;
using Bandtide.Storage.Days;
using Bandtide.Testing.Databases;

namespace Bandtide.Benchmarks;

/// <summary>The reference load: 40 bands, every hour, five quantities (occupancy, sweeps, level, level_p90, floor).</summary>
internal static class ReferenceLoad
{
    public const int Bands = 40;

    public static readonly DateOnly FirstDate = new(2020, 1, 1);

    public static CellGrid Sheet(int seed) => SampleSheets.Make(seed, Bands, presence: 1, signal: false);

    public static PendingDay[] Days(int station, int first, int count) =>
        [.. Enumerable.Range(first, count).Select(day => new PendingDay(new(FirstDate.AddDays(day), Sheet((station * 5000) + day)), []))];

    public static byte[] Csv(CellGrid cells, DateOnly? date)
    {
        var buffer = new ArrayBufferWriter<byte>(64 * 1024);
        DaySheetCsv.Write(buffer, cells, BandPlan.Standard);
        if (date is not { } day)
        {
            return buffer.WrittenSpan.ToArray();
        }

        var text = new StringBuilder();
        foreach (var line in Encoding.ASCII.GetString(buffer.WrittenSpan).Split('\n', StringSplitOptions.RemoveEmptyEntries).Skip(1))
        {
            text.Append(DateText.Format(day)).Append(',').Append(line).Append('\n');
        }

        return Encoding.ASCII.GetBytes(text.ToString());
    }
}
