using System.Buffers;
using System.Globalization;
using System.IO.Compression;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Testing.Databases;

namespace Bandtide.Server.Tests.Hosting;

/// <summary>Bodies of uploads, made from sheets of chance.</summary>
internal static class SampleBodies
{
    /// <summary>First date of every body of many days.</summary>
    public static DateOnly First { get; } = new(2015, 1, 1);

    public static string Date(int day) => First.AddDays(day).ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);

    /// <summary>One day as CSV with its header.</summary>
    public static string Csv(CellGrid cells)
    {
        var text = new ArrayBufferWriter<byte>();
        DaySheetCsv.Write(text, cells, BandPlan.Standard);
        return Encoding.UTF8.GetString(text.WrittenSpan);
    }

    /// <summary>Many days in a row as one CSV body; each day's cells follow from its number alone.</summary>
    public static string Days(int count, int bands = 2)
    {
        var body = new StringBuilder();
        for (var day = 0; day < count; day++)
        {
            var lines = Csv(SampleSheets.Make(day, bands)).Split('\n', StringSplitOptions.RemoveEmptyEntries);
            if (day == 0)
            {
                body.Append("date,").Append(lines[0]).Append('\n');
            }

            foreach (var line in lines.Skip(1))
            {
                body.Append(Date(day)).Append(',').Append(line).Append('\n');
            }
        }

        return body.ToString();
    }

    public static byte[] Gzip(string text)
    {
        using var target = new MemoryStream();
        using (var gzip = new GZipStream(target, CompressionLevel.Fastest))
        {
            gzip.Write(Encoding.UTF8.GetBytes(text));
        }

        return target.ToArray();
    }
}
