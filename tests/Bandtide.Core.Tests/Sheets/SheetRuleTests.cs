using System.Reflection;
using System.Text;
using Bandtide.Core.Sheets;

namespace Bandtide.Core.Tests.Sheets;

/// <summary>Every rule of the contract once, with the line, field and rule that its breach names.</summary>
public sealed class SheetRuleTests
{
    private const string Cell = "hour,band,sweeps,occupancy,level,level_p90\n0,bc-41m,720,0.4,-96.1,-70\n";
    private const string Days = "date,hour,band,sweeps,occupancy\n2026-05-30,0,bc-49m,1,0\n";
    private const string JsonCell = "{\"hour\":0,\"band\":\"bc-41m\",\"sweeps\":720,\"occupancy\":0.4}";

    public static TheoryData<string, string, int, string, string> Broken { get; } = new()
    {
        { "csv", Cell + "24,bc-49m,720,0.4,,\n", 3, "hour", SheetRule.HourRange },
        { "csv", Cell + "0,bc-50m,720,0.4,,\n", 3, "band", SheetRule.BandUnknown },
        { "csv", Cell + "0,bc-49m,1000001,0.4,,\n", 3, "sweeps", SheetRule.SweepsRange },
        { "csv", Cell + "0,bc-49m,720,1.0001,,\n", 3, "occupancy", SheetRule.ShareRange },
        { "csv", Cell + "0,bc-49m,720,0.4,-300.01,\n", 3, "level", SheetRule.DecibelRange },
        { "csv", Cell + "0,bc-49m,720,0.4,-80,-80.01\n", 3, "level_p90", SheetRule.P90BelowLevel },
        { "csv", Cell + "0,bc-41m,720,0.4,,\n", 3, "band", SheetRule.CellTwice },
        { "csv", Cell + "0,bc-49m,,0.4,,\n", 3, "sweeps", SheetRule.ValueMissing },
        { "csv", Cell + "0,bc-49m,720,\"0,4\",,\n", 3, "occupancy", SheetRule.NumberSyntax },
        { "csv", Cell + "0,bc-49m,720,0.4,-inf,\n", 3, "level", SheetRule.NotFinite },
        { "bulk", Days + "30.05.2026,0,bc-49m,1,0\n", 3, "date", SheetRule.DateSyntax },
        { "bulk", Days + "1949-12-31,0,bc-49m,1,0\n", 3, "date", SheetRule.DateRange },
        { "csv", "date,hour,band,sweeps,occupancy\n2026-06-02,0,bc-49m,720,0.4\n", 2, "date", SheetRule.DateMismatch },
        { "bulk", Days + "2026-05-31,0,bc-49m,1,0\n2026-05-30,1,bc-49m,1,0\n", 4, "date", SheetRule.DateAgain },
        { "bulk", Days + "2026-07-01,0,bc-49m,1,0\n", 3, "hour", SheetRule.HourNotEnded },
        { "csv", "", 1, "", SheetRule.HeaderMissing },
        { "csv", "hour,band,sweeps\n", 1, "occupancy", SheetRule.ColumnMissing },
        { "csv", "hour,band,sweeps,occupancy,band\n", 1, "band", SheetRule.ColumnTwice },
        { "csv", Cell + "0,bc-49m,720,0.4,\n", 3, "", SheetRule.FieldCount },
        { "csv", Cell + "0,bc-\"49m\",720,0.4,,\n", 3, "", SheetRule.QuoteSyntax },
        { "csv", Cell + "0,\"bc-49m,720,0.4,,\n", 3, "", SheetRule.QuoteUnclosed },
        { "csv", Cell + "0,bc-\uD800,720,0.4,,\n", 3, "", SheetRule.Utf8 },
        { "json", $"{{\"cells\":[{JsonCell},7]}}", 2, "cells", SheetRule.JsonSyntax },
        { "csv", "hour,band,sweeps,occupancy\n", 0, "", SheetRule.NoCells },
        { "bulk", Days + "2026-05-31,0,bc-49m,1," + new string('0', BulkLimits.MaxDayBytes) + "\n", 3, "", SheetRule.DayTooLarge },
        { "ndjson", string.Concat(Enumerable.Repeat("?\n", BulkLimits.MaxDays + 1)), 0, "", SheetRule.TooManyDays },
        { "json", $"{{\"cells\":[{JsonCell},{{\"hour\":24,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":0}}]}}", 2, "hour", SheetRule.HourRange },
        { "json", $"{{\"cells\":[{JsonCell},{JsonCell}]}}", 2, "band", SheetRule.CellTwice },
        { "json", "{\"cells\":[{\"hour\":0,\"sweeps\":1,\"occupancy\":0}]}", 1, "band", SheetRule.ValueMissing },
        { "json", "{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":null,\"occupancy\":0}]}", 1, "sweeps", SheetRule.ValueMissing },
        { "json", "{\"cells\":[{\"hour\":0,\"band\":\"bc-49m\",\"sweeps\":1,\"occupancy\":-1e-9}]}", 1, "occupancy", SheetRule.ShareRange },
        { "json", "{\"date\":\"2026-06-01\",\"date\":\"2026-06-01\",\"cells\":[" + JsonCell + "]}", 0, "date", SheetRule.DateSyntax },
    };

    [Theory]
    [MemberData(nameof(Broken))]
    public void A_breach_names_line_field_and_rule(string form, string body, int line, string field, string rule)
    {
        // UTF-16 that is no text becomes a byte that is no UTF-8.
        var bytes = Encoding.Latin1.GetBytes(body.Replace('\uD800', '\u00FF'));
        var problem = Assert.Single(Problems(form, bytes));
        Assert.Equal((line, field, rule), (problem.Line, problem.Field, problem.Rule));
        Assert.InRange(problem.Message.Length, 1, 200);
    }

    // The rest are warnings, which do not refuse a day: see SheetWarningsTests and the tests of unknown columns.
    [Fact]
    public void Every_rule_has_an_example()
    {
        var warnings = new[]
        {
            SheetRule.ColumnUnknown, SheetRule.SignalBelowLevel, SheetRule.LevelAboveThreshold, SheetRule.NoSetup, SheetRule.BeforeFirstSetup, SheetRule.CopiedDay,

            // Needs a connection that breaks: see the tests of bulk uploads over the network.
            SheetRule.BodyIncomplete,
        };
        var all = typeof(SheetRule).GetFields(BindingFlags.Public | BindingFlags.Static).Select(constant => (string)constant.GetRawConstantValue()!).ToArray();
        Assert.Equal(all.Order(StringComparer.Ordinal), Broken.Select(row => row.Data.Item5).Concat(warnings).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal));
        Assert.All(all, rule => Assert.True(rule.All(c => c is '-' or (>= 'a' and <= 'z') or (>= '0' and <= '9'))));
    }

    [Fact]
    public void Every_fault_of_a_cell_is_told()
    {
        const string faults = "{\"cells\":[{\"hour\":25,\"band\":\"nowhere\",\"sweeps\":\"x\",\"occupancy\":2,\"level\":400,\"steady\":-1}]}";
        Assert.Equal(["band", "hour", "level", "occupancy", "steady", "sweeps"], Problems("json", Encoding.UTF8.GetBytes(faults)).Select(problem => problem.Field).Order(StringComparer.Ordinal));
        const string rows = "hour,band,sweeps,occupancy,level,steady\n25,nowhere,x,2,400,-1\n";
        Assert.Equal(["hour", "band", "sweeps", "occupancy", "level", "steady"], Problems("csv", Encoding.UTF8.GetBytes(rows)).Select(problem => problem.Field));
    }

    private static IReadOnlyList<SheetProblem> Problems(string form, byte[] body)
    {
        IBulkReader? reader = form switch
        {
            "bulk" => new BulkCsvReader(SheetSamples.Context),
            "ndjson" => new BulkJsonReader(SheetSamples.Context),
            _ => null,
        };
        if (reader is not null)
        {
            var days = new List<BulkDay>();
            reader.Feed(body, days);
            reader.Finish(endedProperly: true, days);
            Assert.All(days.Take(form is "bulk" ? days.Count - 1 : 0), day => Assert.NotNull(day.Reading.Sheet));
            return [days[^1].Reading.Problems[0]];
        }

        var reading = form is "csv"
            ? DaySheetCsv.Read(body, SheetSamples.Date, SheetSamples.Context)
            : DaySheetJson.Read(body, SheetSamples.Date, SheetSamples.Context);
        Assert.Null(reading.Sheet);
        return reading.Problems;
    }
}
