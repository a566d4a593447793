using System.Buffers;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using Bandtide.Core.Time;
using CsCheck;

namespace Bandtide.Core.Tests.Sheets;

public sealed class BulkReadingTests
{
    private const string Header = "date,hour,band,sweeps,occupancy\n";

    [Fact]
    public void Cutting_a_body_anywhere_changes_nothing() =>
        Gen.Select(SheetSamples.Grid.List[1, 5], Gen.Int[1, 300], Gen.Bool, Gen.Bool).Sample((grids, chunk, quoted, json) =>
        {
            var body = json ? Json(grids) : Csv(grids, quoted);
            IBulkReader reader = json ? new BulkJsonReader(SheetSamples.Context) : new BulkCsvReader(SheetSamples.Context);
            var days = Read(reader, body, chunk);
            Assert.Equal(grids.Count, days.Count);
            Assert.All(days.Zip(grids), pair => Assert.True(SheetSamples.Same(pair.First.Reading.Sheet!.Cells, pair.Second)));
        });

    [Fact]
    public void A_bad_row_refuses_its_own_day_and_no_other()
    {
        var days = ReadCsv(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,7\n2026-01-02,1,bc-49m,1,0\n2026-01-03,0,bc-49m,1,0\n");
        Assert.Equal([true, false, true], days.Select(day => day.Reading.Sheet is not null));
        Assert.Equal((3, "occupancy", SheetRule.ShareRange), One(days[1]));
    }

    [Fact]
    public void A_date_that_comes_again_is_refused_there()
    {
        var days = ReadCsv(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,0\n2026-01-01,1,bc-49m,1,0\n");
        Assert.Equal([true, true, false], days.Select(day => day.Reading.Sheet is not null));
        Assert.Equal((4, "date", SheetRule.DateAgain), One(days[2]));
    }

    [Theory]
    [InlineData("yesterday", "yesterday")]
    [InlineData("2026-1-1", "2026-1-1")]
    [InlineData("", "")]
    public void An_unreadable_date_gives_a_refused_day_with_its_text(string date, string shown)
    {
        var day = Assert.Single(ReadCsv(Header + $"{date},0,bc-49m,1,0\n"));
        Assert.Equal((shown, null), (day.DateText, day.Date));
        Assert.Equal((2, "date", SheetRule.DateSyntax), One(day));
    }

    [Fact]
    public void An_unclosed_quote_refuses_its_day_and_ends_the_reading()
    {
        var days = ReadCsv(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,\"bc-49m,1,0\n2026-01-03,0,bc-49m,1,0\n");
        Assert.Equal("2026-01-01 2026-01-02", string.Join(" ", days.Select(day => day.DateText)));
        Assert.NotNull(days[0].Reading.Sheet);
        Assert.Equal((3, "", SheetRule.QuoteUnclosed), One(days[1]));
    }

    [Theory]
    [InlineData("2026-01-02,0,b\"c-49m,1,0\n", SheetRule.QuoteSyntax)]
    [InlineData("\"2026-01-02\",0,bc\"-49m,1,0\n", SheetRule.QuoteSyntax)]
    [InlineData("2026-01-02,0\n", SheetRule.FieldCount)]
    public void A_row_that_cannot_be_split_still_refuses_the_day_of_its_date(string row, string rule)
    {
        var days = ReadCsv(Header + "2026-01-01,0,bc-49m,1,0\n" + row + "2026-01-02,1,bc-49m,1,0\n2026-01-03,0,bc-49m,1,0\n");
        Assert.Equal("2026-01-01 2026-01-02 2026-01-03", string.Join(' ', days.Select(day => day.DateText)));
        Assert.Equal([true, false, true], days.Select(day => day.Reading.Sheet is not null));
        Assert.Equal((3, "", rule), One(days[1]));
    }

    [Theory]
    [InlineData("\"2026-01-02\",0,\"bc-49m,1,0\n")]
    [InlineData("2026-01-02,0,\"bc-49m,1,0\n2026-01-02,1,\"bc-49m\",1,0\n")]
    [InlineData("\"2026-01-02,0,bc-49m,1,0\n")]
    public void An_open_quote_leaves_the_day_before_its_own_alone(string row)
    {
        var days = ReadCsv(Header + "2026-01-01,0,bc-49m,1,0\n" + row);
        Assert.Equal("2026-01-01 2026-01-02", string.Join(' ', days.Select(day => day.DateText)));
        Assert.NotNull(days[0].Reading.Sheet);
        Assert.Equal((3, "", SheetRule.QuoteUnclosed), One(days[1], day => day.Rule is SheetRule.QuoteUnclosed));
    }

    [Theory]
    [InlineData("1,bc-49m,2026-01-02\n", "2026-01-01 2026-01-02")]
    [InlineData("1,bc-49m,1,0,5,2026-01-02\n", "2026-01-01 2026-01-02")]
    [InlineData("1,bc-49m\n", "2026-01-01")]
    public void A_row_of_too_few_or_too_many_fields_refuses_the_day_whose_date_it_has_or_the_one_being_read(string row, string dates)
    {
        var days = ReadCsv("hour,band,sweeps,occupancy,date\n0,bc-49m,1,0,2026-01-01\n" + row);
        Assert.Equal(dates, string.Join(' ', days.Select(day => day.DateText)));
        Assert.Equal((3, "", SheetRule.FieldCount), One(days[^1]));
        Assert.All(days.SkipLast(1), day => Assert.NotNull(day.Reading.Sheet));
    }

    [Fact]
    public void A_text_that_is_no_date_is_shown_cut()
    {
        var day = Assert.Single(ReadCsv(Header + new string('é', 500) + ",0,bc-49m,1,0\n"));
        Assert.Equal(new string('é', 32) + "…", day.DateText);
    }

    [Fact]
    public void A_day_over_two_megabytes_is_refused_and_the_next_one_read()
    {
        var note = new string('x', 100_000);
        var rows = string.Concat(Enumerable.Range(0, 24).Select(hour => $"2026-01-01,{hour},bc-49m,1,0,{note}\n"));
        var days = ReadCsv(Encoding.UTF8.GetBytes("date,hour,band,sweeps,occupancy,note\n" + rows + "2026-01-02,0,bc-49m,1,0,\n"), 4096);
        Assert.Equal((21, "", SheetRule.DayTooLarge), One(days[0]));
        Assert.NotNull(days[1].Reading.Sheet);
    }

    [Fact]
    public void A_date_that_comes_again_in_json_is_refused_there()
    {
        const string cells = "\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":0}]";
        var days = Read(new BulkJsonReader(SheetSamples.Context), Encoding.UTF8.GetBytes($"{{\"date\":\"2026-01-01\",{cells}}}\n{{{cells},\"date\":\"2026-01-02\"}}\n{{\"date\":\"2026-01-01\",{cells}}}\n"), 10);
        Assert.Equal([true, true, false], days.Select(day => day.Reading.Sheet is not null));
        Assert.Equal((0, "date", SheetRule.DateAgain), One(days[2]));
    }

    [Fact]
    public void A_json_date_that_is_none_is_shown()
    {
        var day = Assert.Single(Read(new BulkJsonReader(SheetSamples.Context), "{\"date\":\"2026-13-01\",\"cells\":[]}"u8.ToArray(), 100));
        Assert.Equal(("2026-13-01", null), (day.DateText, day.Date));
    }

    [Fact]
    public void A_header_of_very_many_columns_is_told_in_bounded_words()
    {
        var reader = new BulkCsvReader(SheetSamples.Context);
        Assert.Empty(Read(reader, Encoding.UTF8.GetBytes(string.Concat(Enumerable.Repeat("hour,", 200_000)) + "\n"), 60_000));
        Assert.Equal(100, reader.HeaderProblems.Count);
    }

    // Work that grows with the square of a record's pieces would take hours here: 1.9 MB in pieces of seven bytes.
    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void A_long_record_in_tiny_pieces_is_looked_at_once(bool json)
    {
        IBulkReader reader = json ? new BulkJsonReader(SheetSamples.Context) : new BulkCsvReader(SheetSamples.Context);
        var body = Encoding.UTF8.GetBytes((json ? "{\"note\":\"" : Header + "2026-01-01,0,\"") + new string(json ? 'x' : '\n', 1_900_000));
        Assert.Equal(json ? SheetRule.JsonSyntax : SheetRule.QuoteUnclosed, One(Assert.Single(Read(reader, body, 7))).Rule);
    }

    [Theory]
    [InlineData("", SheetRule.HeaderMissing)]
    [InlineData("hour,band,sweeps,occupancy\n0,bc-49m,1,0\n", SheetRule.ColumnMissing)]
    [InlineData("date,date,hour,band,sweeps,occupancy\n", SheetRule.ColumnTwice)]
    [InlineData("\"date", SheetRule.QuoteUnclosed)]
    public void A_bad_header_refuses_the_body(string body, string rule)
    {
        var reader = new BulkCsvReader(SheetSamples.Context);
        Assert.Empty(Read(reader, Encoding.UTF8.GetBytes(body), 7));
        Assert.Equal(rule, Assert.Single(reader.HeaderProblems).Rule);
        Assert.True(reader.Stopped);
    }

    [Fact]
    public void The_last_day_needs_a_proper_end()
    {
        var reader = new BulkCsvReader(SheetSamples.Context);
        var days = new List<BulkDay>();
        reader.Feed(Encoding.UTF8.GetBytes(Header + "2026-01-01,0,bc-49m,1,0\n2026-01-02,0,bc-49m,1,0\n"), days);
        reader.Finish(endedProperly: false, days);
        Assert.Equal("2026-01-01 2026-01-02", string.Join(" ", days.Select(day => day.DateText)));
        Assert.NotNull(days[0].Reading.Sheet);
        Assert.Equal((4, "", SheetRule.BodyIncomplete), One(days[1]));
    }

    [Fact]
    public void Only_four_thousand_days_are_read()
    {
        var body = Header + string.Concat(Enumerable.Range(0, 4002).Select(n => $"{DateText.Format(new DateOnly(2000, 1, 1).AddDays(n))},0,bc-49m,1,0\n"));
        var days = ReadCsv(body);
        Assert.Equal(4001, days.Count);
        Assert.All(days.Take(4000), day => Assert.NotNull(day.Reading.Sheet));
        Assert.Equal(SheetRule.TooManyDays, One(days[^1]).Rule);
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void A_line_without_end_is_refused_and_not_kept(bool json)
    {
        IBulkReader reader = json ? new BulkJsonReader(SheetSamples.Context) : new BulkCsvReader(SheetSamples.Context);
        var days = new List<BulkDay>();
        reader.Feed(Encoding.UTF8.GetBytes(json ? "" : Header), days);
        var before = GC.GetTotalMemory(forceFullCollection: true);
        var chunk = new byte[1_000_000];
        Array.Fill(chunk, (byte)'x');
        for (var i = 0; i < 200; i++)
        {
            reader.Feed(chunk, days);
        }

        Assert.True(GC.GetTotalMemory(forceFullCollection: true) - before < 20_000_000);
        reader.Feed("\n"u8, days);
        reader.Finish(endedProperly: true, days);
        Assert.Equal(SheetRule.DayTooLarge, Assert.Single(days).Reading.Problems[^1].Rule);
    }

    [Fact]
    public void Bad_json_lines_are_refused_with_their_text()
    {
        var days = Read(new BulkJsonReader(SheetSamples.Context), "{\"date\":1}\nnonsense\n\n{\"cells\":[]}\n"u8.ToArray(), 3);
        Assert.Equal($"{SheetRule.DateSyntax} {SheetRule.JsonSyntax} {SheetRule.DateSyntax}", string.Join(" ", days.Select(day => One(day).Rule)));
        Assert.Equal("nonsense", days[1].DateText);
    }

    [Fact]
    public void No_bytes_whatever_throw() => Gen.Select(Gen.Byte.Array[0, 300], Gen.Int[1, 50], Gen.Bool).Sample((bytes, chunk, json) =>
    {
        IBulkReader reader = json ? new BulkJsonReader(SheetSamples.Context) : new BulkCsvReader(SheetSamples.Context);
        byte[] body = json ? bytes : [.. Encoding.UTF8.GetBytes(Header), .. bytes];
        Assert.All(Read(reader, body, chunk), day => Assert.Equal(day.Reading.Sheet is null, day.Reading.Problems.Count > 0));
    }, iter: 20_000);

    private static (int Line, string Field, string Rule) One(BulkDay day, Func<SheetProblem, bool> wanted) =>
        day.Reading.Problems.Where(wanted).Select(problem => (problem.Line, problem.Field, problem.Rule)).Single();

    private static (int Line, string Field, string Rule) One(BulkDay day) =>
        (Assert.Single(day.Reading.Problems).Line, day.Reading.Problems[0].Field, day.Reading.Problems[0].Rule);

    private static List<BulkDay> ReadCsv(string body) => ReadCsv(Encoding.UTF8.GetBytes(body), 11);

    private static List<BulkDay> ReadCsv(byte[] body, int chunk) => Read(new BulkCsvReader(SheetSamples.Context), body, chunk);

    private static List<BulkDay> Read(IBulkReader reader, byte[] body, int chunk)
    {
        var days = new List<BulkDay>();
        foreach (var part in body.Chunk(chunk))
        {
            reader.Feed(part, days);
        }

        reader.Finish(endedProperly: true, days);
        return days;
    }

    private static byte[] Csv(List<CellGrid> grids, bool quoted)
    {
        var text = new StringBuilder();
        for (var n = 0; n < grids.Count; n++)
        {
            var buffer = new ArrayBufferWriter<byte>();
            DaySheetCsv.Write(buffer, grids[n], BandPlan.Standard);
            var lines = Encoding.UTF8.GetString(buffer.WrittenSpan).TrimEnd('\n').Split('\n');
            text.Append(n == 0 ? $"date,{lines[0]}\r\n" : "");
            var date = DateText.Format(SheetSamples.Date.AddDays(-n));
            text.AppendJoin("", lines.Skip(1).Select(line => quoted ? $"\"{date}\",{line}\r\n" : $"{date},{line}\n"));
        }

        return Encoding.UTF8.GetBytes(text.ToString());
    }

    private static byte[] Json(List<CellGrid> grids)
    {
        var buffer = new ArrayBufferWriter<byte>();
        for (var n = 0; n < grids.Count; n++)
        {
            DaySheetJson.Write(buffer, new(SheetSamples.Date.AddDays(-n), grids[n]), BandPlan.Standard);
            buffer.Write(n % 2 == 0 ? "\n"u8 : "\r\n"u8);
        }

        return buffer.WrittenSpan.ToArray();
    }
}
