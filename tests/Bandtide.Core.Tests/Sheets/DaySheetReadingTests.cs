using System.Buffers;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using CsCheck;

namespace Bandtide.Core.Tests.Sheets;

public sealed class DaySheetReadingTests
{
    private const string Header = "hour,band,sweeps,occupancy,signal,level,level_p90,floor,steady,coverage\n";
    private static readonly string[] Words =
    [
        "hour", "band", "sweeps", "occupancy", ",", "\n", "\"", "0", "bc-49m", "1e999", "-", "{", "}", "[", "]", ":", "cells", "\"cells\"",
        "null", "\uFEFF", "\0", "é",
    ];

    private static readonly Gen<string> Word = Gen.Int[0, Words.Length - 1].Select(i => Words[i]);

    private const string Good = "0,bc-49m,720,0.4312,-78.60,-96.10,-70.35,-98.40,0.02,1\n";

    // The example row of the data contract.
    [Fact]
    public void The_contracts_own_example_is_read()
    {
        var cells = Read(Header + Good).Sheet!.Cells;
        var values = Enum.GetValues<Quantity>().Select(quantity => cells[quantity, 0, 0]);
        Assert.Equal([720, 4312, -7860, -9610, -7035, -9840, 200, 10000], values);
        Assert.Equal(BandPlan.Standard.All.Single(band => string.Equals(band.Code, "bc-49m", StringComparison.Ordinal)).Id, cells.BandIds[0]);
    }

    [Fact]
    public void Csv_written_is_read_back() => SheetSamples.Grid.Sample(grid =>
    {
        var text = new ArrayBufferWriter<byte>();
        DaySheetCsv.Write(text, grid, BandPlan.Standard);
        Assert.True(SheetSamples.Same(grid, DaySheetCsv.Read(text.WrittenSpan, SheetSamples.Date, SheetSamples.Context).Sheet!.Cells));
    });

    [Fact]
    public void Json_written_is_read_back() => SheetSamples.Grid.Sample(grid =>
    {
        var text = new ArrayBufferWriter<byte>();
        DaySheetJson.Write(text, new(SheetSamples.Date, grid), BandPlan.Standard);
        Assert.True(SheetSamples.Same(grid, DaySheetJson.Read(text.WrittenSpan, SheetSamples.Date, SheetSamples.Context).Sheet!.Cells));
    });

    [Fact]
    public void Order_of_rows_and_columns_line_ends_mark_and_quotes_do_not_matter() =>
        Gen.Select(SheetSamples.Grid, Gen.Shuffle(Enumerable.Range(0, 10).ToArray()), Gen.Int, Gen.Bool, Gen.Bool).Sample((grid, order, seed, crlf, mark) =>
        {
            var written = new ArrayBufferWriter<byte>();
            DaySheetCsv.Write(written, grid, BandPlan.Standard);
            var rows = Encoding.UTF8.GetString(written.WrittenSpan).TrimEnd('\n').Split('\n').Select(line => line.Split(',')).ToArray();
            new Random(seed).Shuffle(rows.AsSpan(1));
            var text = (mark ? "\uFEFF" : "") + string.Join(crlf ? "\r\n" : "\n", rows.Select(fields => string.Join(',', order.Select(c => c % 3 == 0 ? $"\"{fields[c]}\"" : fields[c]))));
            Assert.True(SheetSamples.Same(grid, DaySheetCsv.Read(Encoding.UTF8.GetBytes(text), SheetSamples.Date, SheetSamples.Context).Sheet!.Cells));
        });

    [Theory]
    [InlineData("24,bc-49m,720,0.4,,,,,,", "hour", SheetRule.HourRange)]
    [InlineData("-1,bc-49m,720,0.4,,,,,,", "hour", SheetRule.HourRange)]
    [InlineData("1.5,bc-49m,720,0.4,,,,,,", "hour", SheetRule.HourRange)]
    [InlineData(",bc-49m,720,0.4,,,,,,", "hour", SheetRule.ValueMissing)]
    [InlineData("0,bc-50m,720,0.4,,,,,,", "band", SheetRule.BandUnknown)]
    [InlineData("0,BC-49M,720,0.4,,,,,,", "band", SheetRule.BandUnknown)]
    [InlineData("0,,720,0.4,,,,,,", "band", SheetRule.ValueMissing)]
    [InlineData("0,bc-49m,0,0.4,,,,,,", "sweeps", SheetRule.SweepsRange)]
    [InlineData("0,bc-49m,1000001,0.4,,,,,,", "sweeps", SheetRule.SweepsRange)]
    [InlineData("0,bc-49m,1.5,0.4,,,,,,", "sweeps", SheetRule.SweepsRange)]
    [InlineData("0,bc-49m,,0.4,,,,,,", "sweeps", SheetRule.ValueMissing)]
    [InlineData("0,bc-49m,720,,,,,,,", "occupancy", SheetRule.ValueMissing)]
    [InlineData("0,bc-49m,720,1.00001,,,,,,", "occupancy", SheetRule.ShareRange)]
    [InlineData("0,bc-49m,720,-0.00001,,,,,,", "occupancy", SheetRule.ShareRange)]
    [InlineData("0,bc-49m,720,NaN,,,,,,", "occupancy", SheetRule.NotFinite)]
    [InlineData("0,bc-49m,720,0.4,Infinity,,,,,", "signal", SheetRule.NotFinite)]
    [InlineData("0,bc-49m,720,0.4,-300.001,,,,,", "signal", SheetRule.DecibelRange)]
    [InlineData("0,bc-49m,720,0.4,,300.01,,,,", "level", SheetRule.DecibelRange)]
    [InlineData("0,bc-49m,720,0.4,,loud,,,,", "level", SheetRule.NumberSyntax)]
    [InlineData("0,bc-49m,720,0.4,,-80,-80.001,,,", "level_p90", SheetRule.P90BelowLevel)]
    [InlineData("0,bc-49m,720,0.4,,,,1e9,,", "floor", SheetRule.DecibelRange)]
    [InlineData("0,bc-49m,720,0.4,,,,,1.1,", "steady", SheetRule.ShareRange)]
    [InlineData("0,bc-49m,720,0.4,,,,,,2", "coverage", SheetRule.ShareRange)]
    [InlineData("0,bc-49m,720,0.4", "", SheetRule.FieldCount)]
    [InlineData("0,bc-49m,720,\"0\"4,,,,,,", "", SheetRule.QuoteSyntax)]
    [InlineData("0,bc-49m,720,\"0.4,,,,,,", "", SheetRule.QuoteUnclosed)]
    public void A_bad_row_names_line_field_and_rule(string row, string field, string rule)
    {
        var reading = Read(Header + Good.Replace("0,bc-49m", "0,bc-41m", StringComparison.Ordinal) + row);
        Assert.Null(reading.Sheet);
        var problem = Assert.Single(reading.Problems);
        Assert.Equal((3, field, rule), (problem.Line, problem.Field, problem.Rule));
    }

    [Theory]
    [InlineData("", SheetRule.HeaderMissing, "")]
    [InlineData("hour,band,sweeps\n0,bc-49m,720\n", SheetRule.ColumnMissing, "occupancy")]
    [InlineData("hour,band,sweeps,occupancy,hour\n", SheetRule.ColumnTwice, "hour")]
    [InlineData("hour,band,sweeps,occupancy\n", SheetRule.NoCells, "")]
    [InlineData("date,hour,band,sweeps,occupancy\n2026-06-02,0,bc-49m,720,0.4\n", SheetRule.DateMismatch, "date")]
    [InlineData("hour,band,sweeps,occupancy\n0,bc-49m,720,0.4\n0,bc-49m,720,0.5\n", SheetRule.CellTwice, "band")]
    public void A_bad_body_names_the_rule(string body, string rule, string field)
    {
        var problem = Assert.Single(Read(body).Problems);
        Assert.Equal((rule, field), (problem.Rule, problem.Field));
    }

    [Fact]
    public void Bytes_that_are_not_utf8_are_refused() =>
        Assert.Equal(SheetRule.Utf8, Assert.Single(DaySheetCsv.Read([0x68, 0xFF, 0x0A], SheetSamples.Date, SheetSamples.Context).Problems).Rule);

    [Fact]
    public void Unknown_columns_are_ignored_with_a_warning()
    {
        var reading = Read("hour,band,sweeps,occupancy,mood\n0,bc-49m,720,0.4,fine\n");
        Assert.NotNull(reading.Sheet);
        Assert.Equal((SheetRule.ColumnUnknown, 1), (Assert.Single(reading.Warnings).Rule, reading.Warnings[0].Count));
    }

    [Fact]
    public void Empty_columns_that_spreadsheets_leave_are_unknown_ones()
    {
        var reading = Read("hour,band,sweeps,occupancy,,\n0,bc-49m,720,0.4,,\n");
        Assert.NotNull(reading.Sheet);
        Assert.Equal((SheetRule.ColumnUnknown, 2), (Assert.Single(reading.Warnings).Rule, reading.Warnings[0].Count));
    }

    [Theory]
    [InlineData(" 0,bc-49m,720,0.4", "hour", SheetRule.HourRange)]
    [InlineData("0,bc-49m ,720,0.4", "band", SheetRule.BandUnknown)]
    [InlineData("0,bc-49m,720, 0.4", "occupancy", SheetRule.NumberSyntax)]
    [InlineData("0,bc-49m,1 000,0.4", "sweeps", SheetRule.NumberSyntax)]
    public void Blanks_around_or_inside_a_value_are_refused(string row, string field, string rule)
    {
        var problem = Assert.Single(Read("hour,band,sweeps,occupancy\n" + row).Problems);
        Assert.Equal((2, field, rule), (problem.Line, problem.Field, problem.Rule));
    }

    // A value that would round into its range is outside it all the same; order is judged as written, however fine.
    [Theory]
    [InlineData("300.004,300.004", SheetRule.DecibelRange)]
    [InlineData("-80.001,-80.002", SheetRule.P90BelowLevel)]
    [InlineData("-80.00000000001,-80.00000000002", SheetRule.P90BelowLevel)]
    [InlineData("-80.002,-80.001", "")]
    [InlineData("-80.0000,-8e1", "")]
    public void Ranges_and_order_are_judged_before_rounding(string values, string rule)
    {
        var problems = Read("hour,band,sweeps,occupancy,level,level_p90\n0,bc-49m,720,0.4," + values).Problems;
        Assert.Equal(rule, string.Join(' ', problems.Select(problem => problem.Rule).Distinct(StringComparer.Ordinal)));
    }

    [Fact]
    public void Values_are_rounded_half_away_from_zero()
    {
        var cells = Read("hour,band,sweeps,occupancy,signal,level\n0,bc-49m,720,0.00005,-78.605,78.605").Sheet!.Cells;
        Assert.Equal((1, -7861, 7861), (cells[Quantity.Occupancy, 0, 0], cells[Quantity.Signal, 0, 0], cells[Quantity.Level, 0, 0]));
    }

    [Fact]
    public void Escapes_and_nulls_of_json_are_read()
    {
        const string body = "{\"cells\":[{\"b\\u0061nd\":\"bc\\u002d49m\",\"occupancy\":5e-1,\"hour\":2,\"sweeps\":720,\"signal\":null}],\"date\":\"2026-06-01\"}";
        var cells = DaySheetJson.Read(Encoding.UTF8.GetBytes(body), SheetSamples.Date, SheetSamples.Context).Sheet!.Cells;
        Assert.Equal((5000, CellGrid.Missing), (cells[Quantity.Occupancy, 2, 0], cells[Quantity.Signal, 2, 0]));
    }

    [Fact]
    public void Lines_are_those_of_the_body_with_quoted_line_ends_and_empty_lines()
    {
        var problem = Assert.Single(Read("hour,band,sweeps,occupancy,note\r\n0,bc-49m,720,0.4,\"two\r\nlines\"\r\n\r\n99,bc-41m,720,0.4,\r\n").Problems);
        Assert.Equal((5, "hour"), (problem.Line, problem.Field));
    }

    [Theory]
    [InlineData("2026-06-01T10:04:59Z", 9, true)]
    [InlineData("2026-06-01T09:55:00Z", 9, true)]
    [InlineData("2026-06-01T09:54:59Z", 9, false)]
    [InlineData("2026-06-01T23:55:00Z", 23, true)]
    [InlineData("2026-05-31T23:56:00Z", 0, false)]
    public void An_hour_that_has_not_ended_is_refused_with_five_minutes_allowance(string now, int hour, bool accepted)
    {
        var moment = DateTimeOffset.Parse(now, System.Globalization.CultureInfo.InvariantCulture);
        var body = $"hour,band,sweeps,occupancy\n{hour},bc-49m,720,0.4\n";
        var reading = DaySheetCsv.Read(Encoding.UTF8.GetBytes(body), SheetSamples.Date, new(BandPlan.Standard, moment));
        Assert.Equal(accepted, reading.Sheet is not null);
    }

    [Theory]
    [InlineData("1949-12-31")]
    [InlineData("2026-07-02")]
    public void A_date_before_1950_or_after_today_is_refused(string date)
    {
        var day = DateOnly.Parse(date, System.Globalization.CultureInfo.InvariantCulture);
        var reading = DaySheetCsv.Read(Encoding.UTF8.GetBytes(Header + Good), day, SheetSamples.Context);
        Assert.Equal(SheetRule.DateRange, Assert.Single(reading.Problems).Rule);
    }

    [Fact]
    public void Every_error_is_told_up_to_a_hundred() =>
        Assert.Equal(100, Read(Header + string.Concat(Enumerable.Repeat("99,bc-49m,720,0.4,,,,,,\n", 500))).Problems.Count);

    [Theory]
    [InlineData("[]", SheetRule.JsonSyntax, 0, "")]
    [InlineData("{", SheetRule.JsonSyntax, 0, "")]
    [InlineData("{\"cells\":{}}", SheetRule.JsonSyntax, 0, "cells")]
    [InlineData("{\"cells\":[]}", SheetRule.NoCells, 0, "")]
    [InlineData("{\"date\":\"2026-06-02\",\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":0}]}", SheetRule.DateMismatch, 0, "date")]
    [InlineData("{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":0},7]}", SheetRule.JsonSyntax, 2, "cells")]
    [InlineData("{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":\"0.5\"}]}", SheetRule.NumberSyntax, 1, "occupancy")]
    [InlineData("{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":\"NaN\"}]}", SheetRule.NotFinite, 1, "occupancy")]
    [InlineData("{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"sweeps\":2,\"occupancy\":0}]}", SheetRule.ColumnTwice, 1, "sweeps")]
    [InlineData("{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":0,\"level\":-1,\"levelP90\":-2}]}", SheetRule.P90BelowLevel, 1, "levelP90")]
    public void Bad_json_names_place_field_and_rule(string body, string rule, int place, string field)
    {
        var problem = Assert.Single(DaySheetJson.Read(Encoding.UTF8.GetBytes(body), SheetSamples.Date, SheetSamples.Context).Problems);
        Assert.Equal((rule, place, field), (problem.Rule, problem.Line, problem.Field));
    }

    [Fact]
    public void No_body_whatever_throws() => Gen.OneOf(
        Gen.Byte.Array[0, 400],
        Word.Array[0, 60].Select(words => Encoding.UTF8.GetBytes(string.Concat(words))))
        .Sample(body =>
        {
            foreach (var reading in new[] { DaySheetCsv.Read(body, SheetSamples.Date, SheetSamples.Context), DaySheetJson.Read(body, SheetSamples.Date, SheetSamples.Context) })
            {
                Assert.Equal(reading.Sheet is null, reading.Problems.Count > 0);
            }
        }, iter: 20_000);

    private static SheetReading Read(string body) => DaySheetCsv.Read(Encoding.UTF8.GetBytes(body), SheetSamples.Date, SheetSamples.Context);
}
