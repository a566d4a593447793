using System.Globalization;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Testing;

namespace Bandtide.Core.Tests.Sheets;

/// <summary>Measured files read in full against sums made by plain splitting and decimal arithmetic.</summary>
public sealed class MeasuredSheetTests
{
    public static TheoryData<string> Files { get; } = [MeasuredData.Tokyo, .. MeasuredData.Beside];

    public static bool AnyBeside => MeasuredData.Beside.Count > 0;

    [Theory]
    [MemberData(nameof(Files))]
    public void Every_value_of_a_measured_file_is_read_packed_and_written_again(string path)
    {
        var body = File.ReadAllBytes(path);
        var days = Read(body);
        var lines = File.ReadAllLines(path);
        var columns = lines[0].Split(',');
        var rows = lines.Skip(1).Select(line => line.Split(',')).ToArray();
        Assert.All(days, day => Assert.Empty(day.Reading.Problems));
        Assert.Equal(rows.Select(row => row[Array.IndexOf(columns, "date")]).Distinct(StringComparer.Ordinal), days.Select(day => day.DateText));
        var writer = new System.Buffers.ArrayBufferWriter<byte>();
        DaySheetCsv.WriteHeader(writer, withDate: true);
        foreach (var sheet in days.Select(day => day.Reading.Sheet!))
        {
            var cells = SheetCodec.Decode(SheetCodec.Encode(sheet.Cells));
            DaySheetCsv.WriteRows(writer, new(sheet.Date, cells), BandPlan.Standard);
        }

        foreach (var sheets in new[] { days, Read(writer.WrittenSpan.ToArray()) })
        {
            Assert.Equal(rows.Length, sheets.Sum(day => day.Reading.Sheet!.Cells.Count));
            foreach (var quantity in Enum.GetValues<Quantity>())
            {
                var column = Array.IndexOf(columns, SheetFields.Csv[(int)SheetFields.FieldOf(quantity)]);
                var texts = rows.Where(_ => column >= 0).Select(row => row[column]).Where(text => text.Length > 0).ToArray();
                var decimals = SheetFields.Decimals(quantity);
                var values = sheets.SelectMany(day => day.Reading.Sheet!.Cells.Plane(quantity).ToArray()).Where(value => value != CellGrid.Missing).ToArray();
                Assert.Equal(texts.Length, values.Length);
                Assert.Equal(texts.Sum(text => decimal.Round(decimal.Parse(text, CultureInfo.InvariantCulture), decimals, MidpointRounding.AwayFromZero)), values.Sum(value => FixedPoint.Number(value, decimals)));
            }
        }
    }

    [Fact(Skip = "No folder shared/data/daysheets beside the repository: only the file in Measured is read.", SkipUnless = nameof(AnyBeside))]
    public void Files_beside_the_repository_are_read_too() => Assert.True(Files.Count > 1);

    private static List<BulkDay> Read(byte[] body)
    {
        var (reader, days) = (new BulkCsvReader(SheetSamples.Context), new List<BulkDay>());
        reader.Feed(body, days);
        reader.Finish(endedProperly: true, days);
        return days;
    }
}
