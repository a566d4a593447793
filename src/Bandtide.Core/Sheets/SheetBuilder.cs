using System.Globalization;
using System.Text;
using Bandtide.Core.Bands;

namespace Bandtide.Core.Sheets;

/// <summary>Collects the cells of one day, judges each by the contract's rules, and gives a sheet or every problem found.</summary>
internal sealed class SheetBuilder
{
    public const int MaxProblems = 100;
    private const int MaxQuoted = 40;
    private static readonly TimeSpan ClockAllowance = TimeSpan.FromMinutes(5);

    private readonly SheetContext context;
    private readonly IReadOnlyList<string> names;
    private readonly DateOnly? date;
    private readonly List<SheetProblem> problems = [];
    private readonly List<(Band Band, int[] Cells)> bands = [];
    private readonly Dictionary<short, int> places = [];
    private readonly int endedHours;
    private int lastPlace = -1;
    private short lastBand = -1;
    private bool anyCell;

    /// <param name="context">Plan and moment of judgement.</param>
    /// <param name="names">Names of the fields in this format.</param>
    /// <param name="date">The date, or <c>null</c> when it could not be read, which is a problem already told.</param>
    /// <param name="line">Line of the date, for problems with it.</param>
    public SheetBuilder(SheetContext context, IReadOnlyList<string> names, DateOnly? date, int line)
    {
        (this.context, this.names, this.date) = (context, names, date);
        if (date is not { } day)
        {
            return;
        }

        var today = DateOnly.FromDateTime(context.Now.UtcDateTime);
        if (day.Year < 1950 || day > today)
        {
            Add(line, "date", SheetRule.DateRange, $"{Time.DateText.Format(day)} is not from 1950-01-01 to today, {Time.DateText.Format(today)} (UTC).");
            endedHours = 24;
            return;
        }

        var sinceMidnight = context.Now + ClockAllowance - new DateTimeOffset(day.ToDateTime(TimeOnly.MinValue), TimeSpan.Zero);
        endedHours = (int)Math.Min(24, Math.Floor(sinceMidnight.TotalHours));
    }

    public bool HasProblems => problems.Count > 0;

    public void Add(int line, string field, string rule, string message)
    {
        if (problems.Count < MaxProblems)
        {
            problems.Add(new(line, field, rule, message));
        }
    }

    /// <summary>Judges one cell and keeps it when it is good.</summary>
    /// <param name="line">Its line or place.</param>
    /// <param name="text">The text that the slices point into.</param>
    /// <param name="slices">One per <see cref="SheetField"/>.</param>
    public void AddCell(int line, ReadOnlySpan<byte> text, ReadOnlySpan<FieldSlice> slices)
    {
        anyCell = true;
        var before = problems.Count;
        Span<int> values = stackalloc int[CellGrid.QuantityCount];
        var hour = Hour(line, text, slices[(int)SheetField.Hour]);
        var place = Place(line, text, slices[(int)SheetField.Band]);
        for (var field = SheetField.Sweeps; field <= SheetField.Coverage; field++)
        {
            values[(int)SheetFields.QuantityOf(field)] = Value(line, field, text, slices[(int)field]);
        }

        if (problems.Count != before || problems.Count == MaxProblems)
        {
            return;
        }

        CheckPercentile(line, text, slices);
        var cells = bands[place].Cells.AsSpan(hour * CellGrid.QuantityCount, CellGrid.QuantityCount);
        if (cells[(int)Quantity.Sweeps] != CellGrid.Missing)
        {
            Add(line, Name(SheetField.Band), SheetRule.CellTwice, $"Hour {hour} of {bands[place].Band.Code} is there already.");
            return;
        }

        values.CopyTo(cells);
    }

    public SheetReading Build(IReadOnlyList<SheetWarning> warnings)
    {
        if (!anyCell && problems.Count == 0)
        {
            Add(0, "", SheetRule.NoCells, "The sheet holds no cell. A day without observation is not sent at all.");
        }

        return problems.Count > 0 || date is not { } day
            ? new(null, problems, warnings)
            : new(new(day, Grid()), [], warnings);
    }

    /// <summary>A value in quotes for a message, cut when long; bytes that are not UTF-8 show as a replacement mark.</summary>
    public static string Quote(ReadOnlySpan<byte> text)
    {
        var shown = Encoding.UTF8.GetString(text[..Math.Min(text.Length, MaxQuoted)]);
        var clean = string.Concat(shown.Select(c => char.IsControl(c) ? '\uFFFD' : c));
        return text.Length > MaxQuoted ? $"'{clean}…'" : $"'{clean}'";
    }

    private string Name(SheetField field) => names[(int)field];

    private int Hour(int line, ReadOnlySpan<byte> text, FieldSlice slice)
    {
        var value = slice.Of(text);
        if (value.IsEmpty)
        {
            Missing(line, SheetField.Hour);
            return 0;
        }

        var number = DecimalText.Read(value, 0);
        if (number.Status != DecimalStatus.Ok || number.Tail != 0 || number.Units is < 0 or > 23)
        {
            Add(line, Name(SheetField.Hour), SheetRule.HourRange, $"{Quote(value)} is not a whole hour from 0 to 23.");
            return 0;
        }

        if (date is not null && number.Units >= endedHours)
        {
            Add(line, Name(SheetField.Hour), SheetRule.HourNotEnded, string.Create(
                CultureInfo.InvariantCulture, $"Hour {number.Units} (UTC) has not ended; it is {context.Now.UtcDateTime:yyyy-MM-dd HH:mm} UTC now."));
        }

        return (int)number.Units;
    }

    // Rows of one hour usually name each band once, rows of one band come together: remember the last.
    private int Place(int line, ReadOnlySpan<byte> text, FieldSlice slice)
    {
        var code = slice.Of(text);
        if (code.IsEmpty)
        {
            Missing(line, SheetField.Band);
            return 0;
        }

        if (!context.Plan.TryGet(code, out var band))
        {
            Add(line, Name(SheetField.Band), SheetRule.BandUnknown, $"{Quote(code)} is not a band of the plan; GET /api/v1/bands lists them.");
            return 0;
        }

        if (band.Id == lastBand)
        {
            return lastPlace;
        }

        if (!places.TryGetValue(band.Id, out var place))
        {
            place = bands.Count;
            var cells = new int[CellGrid.Hours * CellGrid.QuantityCount];
            cells.AsSpan().Fill(CellGrid.Missing);
            bands.Add((band, cells));
            places.Add(band.Id, place);
        }

        (lastBand, lastPlace) = (band.Id, place);
        return place;
    }

    private int Value(int line, SheetField field, ReadOnlySpan<byte> text, FieldSlice slice)
    {
        var value = slice.Of(text);
        if (value.IsEmpty)
        {
            if (SheetFields.IsRequired(field))
            {
                Missing(line, field);
            }

            return CellGrid.Missing;
        }

        var quantity = SheetFields.QuantityOf(field);
        var number = DecimalText.Read(value, SheetFields.Decimals(quantity));
        if (number.Status == DecimalStatus.Ok)
        {
            var (low, high, rule, allowed) = Limits(quantity);
            if (number.Within(low, high) && (quantity != Quantity.Sweeps || number.Tail == 0))
            {
                return (int)number.Rounded;
            }

            Add(line, Name(field), rule, $"{Quote(value)} is not {allowed}.");
        }
        else if (number.Status == DecimalStatus.NotFinite)
        {
            Add(line, Name(field), SheetRule.NotFinite, $"{Quote(value)} is not a finite number; leave an unknown optional value empty.");
        }
        else
        {
            Add(line, Name(field), SheetRule.NumberSyntax, $"{Quote(value)} is not a number with a decimal point.");
        }

        return CellGrid.Missing;
    }

    private static (long Low, long High, string Rule, string Allowed) Limits(Quantity quantity) => quantity switch
    {
        Quantity.Sweeps => (1, SheetFields.MaxSweeps, SheetRule.SweepsRange, "a whole number from 1 to 1000000"),
        Quantity.Occupancy or Quantity.Steady or Quantity.Coverage => (0, 10_000, SheetRule.ShareRange, "a share from 0 to 1"),
        _ => (-SheetFields.MaxDecibels * 100, SheetFields.MaxDecibels * 100, SheetRule.DecibelRange, "from -300 to 300 dB"),
    };

    // Compared as written, before rounding.
    private void CheckPercentile(int line, ReadOnlySpan<byte> text, ReadOnlySpan<FieldSlice> slices)
    {
        var level = slices[(int)SheetField.Level].Of(text);
        var p90 = slices[(int)SheetField.LevelP90].Of(text);
        if (level.IsEmpty || p90.IsEmpty)
        {
            return;
        }

        var (a, b) = (DecimalText.Read(level, 2), DecimalText.Read(p90, 2));
        if (b.Units < a.Units || (b.Units == a.Units && b.Tail < a.Tail))
        {
            Add(line, Name(SheetField.LevelP90), SheetRule.P90BelowLevel, $"{Quote(p90)} is below the level {Quote(level)}.");
        }
    }

    private void Missing(int line, SheetField field) =>
        Add(line, Name(field), SheetRule.ValueMissing, $"Every cell needs {Name(field)}.");

    private CellGrid Grid()
    {
        var sorted = bands.OrderBy(entry => entry.Band.Id).ToArray();
        var planes = new int[]?[CellGrid.QuantityCount];
        for (var quantity = 0; quantity < planes.Length; quantity++)
        {
            var plane = new int[CellGrid.Hours * sorted.Length];
            var any = false;
            for (var b = 0; b < sorted.Length; b++)
            {
                for (var hour = 0; hour < CellGrid.Hours; hour++)
                {
                    var value = sorted[b].Cells[(hour * CellGrid.QuantityCount) + quantity];
                    plane[(hour * sorted.Length) + b] = value;
                    any |= value != CellGrid.Missing;
                }
            }

            planes[quantity] = any ? plane : null;
        }

        return new([.. sorted.Select(entry => entry.Band.Id)], planes);
    }
}
