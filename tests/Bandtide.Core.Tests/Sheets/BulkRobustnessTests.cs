using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using CsCheck;

namespace Bandtide.Core.Tests.Sheets;

/// <summary>Bodies of many days with things that go wrong, made by damaging good ones.</summary>
public sealed class BulkRobustnessTests
{
    private const string Header = "date,hour,band,sweeps,occupancy,level,level_p90\n";

    private static readonly string[] Pieces =
    [
        "\n", "\r\n", "\"", "\"\"", ",", ",,", "NaN", "1e400", "-", "2026-01-01", "2026-01-02", "bc-49m", "\0", "\uFEFF", "é", "{", "}", "[", "]", ":",
        "null", "\"cells\":[", "\"date\":\"2026-01-03\"", "{}\n", "\\u0000", "999999999999999999999", "[[[[[[[[[[[[[[[[[[[",
    ];

    private static readonly Gen<(int At, int Delete, byte[] Insert)> Damage = Gen.Select(
        Gen.Int[0, 100_000], Gen.Int[0, 12], Gen.OneOf(Gen.Int[0, Pieces.Length - 1].Select(n => Encoding.UTF8.GetBytes(Pieces[n])), Gen.Byte.Array[0, 3]));

    private static readonly Gen<byte[]> CsvBody = Damaged(Csv);
    private static readonly Gen<byte[]> JsonBody = Damaged(Json);

    [Fact]
    public void Damaged_bodies_never_throw_and_every_day_is_a_sheet_or_has_problems() =>
        Gen.Select(CsvBody, JsonBody).Sample((csv, json) =>
        {
            AssertSound(Read(new BulkCsvReader(SheetSamples.Context), csv, csv.Length));
            AssertSound(Read(new BulkJsonReader(SheetSamples.Context), json, json.Length));
        }, iter: 2_000);

    [Fact]
    public void Damaged_bodies_of_one_day_never_throw() => Gen.Select(CsvBody, JsonBody).Sample((csv, json) =>
    {
        var date = new DateOnly(2026, 1, 1);
        foreach (var reading in new[] { DaySheetCsv.Read(csv, date, SheetSamples.Context), DaySheetJson.Read(json, date, SheetSamples.Context) })
        {
            Assert.Equal(reading.Sheet is null, reading.Problems.Count is > 0 and <= 100);
        }
    }, iter: 2_000);

    [Fact]
    public void Where_a_damaged_body_is_cut_changes_nothing() =>
        Gen.Select(CsvBody, JsonBody, Gen.Int[1, 40]).Sample((csv, json, piece) =>
        {
            Assert.Equal(Told(new BulkCsvReader(SheetSamples.Context), csv, csv.Length), Told(new BulkCsvReader(SheetSamples.Context), csv, piece));
            Assert.Equal(Told(new BulkJsonReader(SheetSamples.Context), json, json.Length), Told(new BulkJsonReader(SheetSamples.Context), json, piece));
        }, iter: 1_000);

    [Fact]
    public void Cutting_a_body_at_each_single_place_changes_nothing()
    {
        var body = Encoding.UTF8.GetBytes("\uFEFF" + Header.Replace("\n", "\r\n", StringComparison.Ordinal)
            + "2026-01-01,0,bc-49m,1,0,,\r\n2026-01-01,1,\"bc-49m\",1,0,,\r\n2026-01-02,0,b\"c,1,0,,\r\n\r\n\"2026-01-03\",0,bc-49m,1,\"0\",,\n2026-01-04,0,bc-49m,\"1,0,,\n");
        var whole = Told(new BulkCsvReader(SheetSamples.Context), body, body.Length);
        for (var cut = 1; cut < body.Length; cut++)
        {
            var (reader, days) = (new BulkCsvReader(SheetSamples.Context), new List<BulkDay>());
            reader.Feed(body.AsSpan(0, cut), days);
            reader.Feed(body.AsSpan(cut), days);
            reader.Finish(endedProperly: true, days);
            Assert.Equal(whole, Told(reader, days));
        }
    }

    // Whatever stands in a row behind its date, the days of other rows are as they were; or reading ended at an open quote.
    [Fact]
    public void A_damaged_row_refuses_its_own_day_and_no_other() =>
        Gen.Select(Gen.Int[0, 8], SheetSamples.OneOf("\"", "\"\"", "x\"", ",", "", "NaN", "1,5", "\0", "é", "\"a\"b", "bc-49m,1,0,,,,").Array[0, 5].Select(string.Concat), Gen.Bool)
            .Sample((damaged, rest, dateLast) =>
            {
                var rows = Enumerable.Range(0, 9).Select(n => (Date: $"2026-01-0{n / 3 + 1}", Tail: n == damaged ? rest : $"{n % 3},bc-49m,1,0,,")).ToArray();
                var text = dateLast
                    ? "hour,band,sweeps,occupancy,level,level_p90,date\n" + string.Concat(rows.Select(row => $"{row.Tail},{row.Date}\n"))
                    : Header + string.Concat(rows.Select(row => $"{row.Date},{row.Tail}\n"));
                var days = Read(new BulkCsvReader(SheetSamples.Context), Encoding.UTF8.GetBytes(text), 50);
                var isUnclosed = days[^1].Reading.Problems.Any(problem => problem.Rule is SheetRule.QuoteUnclosed);
                for (var n = 0; n < 3; n++)
                {
                    var own = days.Where(day => day.Date == new DateOnly(2026, 1, n + 1)).ToArray();
                    if (n == damaged / 3 || (isUnclosed && n > damaged / 3))
                    {
                        Assert.All(own, day => Assert.True(day.Reading.Sheet is null || day.Reading.Sheet.Cells.Count == 3));
                    }
                    else
                    {
                        Assert.Equal(3, Assert.Single(own).Reading.Sheet?.Cells.Count);
                    }
                }
            }, iter: 2_000);

    private static Gen<byte[]> Damaged(Func<CellGrid[], byte[]> write) =>
        Gen.Select(SheetSamples.Grid.Array[1, 3], Damage.Array[0, 4]).Select((grids, damages) =>
        {
            var body = new List<byte>(write(grids));
            foreach (var (at, delete, insert) in damages)
            {
                var place = at % (body.Count + 1);
                body.RemoveRange(place, Math.Min(delete, body.Count - place));
                body.InsertRange(place, insert);
            }

            return body.ToArray();
        });

    private static byte[] Csv(CellGrid[] grids)
    {
        var writer = new System.Buffers.ArrayBufferWriter<byte>();
        DaySheetCsv.WriteHeader(writer, withDate: true);
        for (var n = 0; n < grids.Length; n++)
        {
            DaySheetCsv.WriteRows(writer, new(new(2026, 1, 1 + n), grids[n]), BandPlan.Standard);
        }

        return writer.WrittenSpan.ToArray();
    }

    private static byte[] Json(CellGrid[] grids)
    {
        var writer = new System.Buffers.ArrayBufferWriter<byte>();
        for (var n = 0; n < grids.Length; n++)
        {
            DaySheetJson.Write(writer, new(new(2026, 1, 1 + n), grids[n]), BandPlan.Standard);
            System.Buffers.BuffersExtensions.Write(writer, "\n"u8);
        }

        return writer.WrittenSpan.ToArray();
    }

    private static void AssertSound(List<BulkDay> days) => Assert.All(days, day =>
    {
        Assert.Equal(day.Reading.Sheet is null, day.Reading.Problems.Count is > 0 and <= 100);
        Assert.True(day.Reading.Sheet is null || day.Reading.Sheet.Date == day.Date);
        Assert.All(day.Reading.Problems, problem => Assert.True(problem.Line >= 0 && problem.Rule.Length > 0 && problem.Message.Length is > 0 and < 300));
    });

    private static List<BulkDay> Read(IBulkReader reader, byte[] body, int piece)
    {
        var days = new List<BulkDay>();
        foreach (var part in body.Chunk(Math.Max(1, piece)))
        {
            reader.Feed(part, days);
        }

        reader.Finish(endedProperly: true, days);
        return days;
    }

    private static string Told(IBulkReader reader, byte[] body, int piece) => Told(reader, Read(reader, body, piece));

    private static string Told(IBulkReader reader, List<BulkDay> days) => string.Join('\n', reader.HeaderProblems.Select(problem => problem.ToString()).Concat(days.Select(day =>
        $"{day.DateText} {day.Date} {day.Bytes} {string.Join('|', day.Reading.Problems)} {string.Join('|', day.Reading.Warnings)} "
        + (day.Reading.Sheet is { } sheet ? SheetChecksum.Compute(sheet.Cells, BandPlan.Standard) : "refused"))));
}
