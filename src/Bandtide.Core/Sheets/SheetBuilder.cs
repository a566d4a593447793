using System.Globalization;
using Bandtide.Core.Bands;
using Bandtide.Core.Time;

namespace Bandtide.Core.Sheets;

/// <summary>Collects the cells of one day, judges each by the contract's rules, and gives a sheet or every problem found.</summary>
internal sealed class SheetBuilder
{
    private static readonly TimeSpan ClockAllowance = TimeSpan.FromMinutes(5);

    private readonly SheetContext context;
    private readonly IReadOnlyList<string> names;
    private readonly DateOnly? date;
    private readonly List<(Band Band, int[] Cells)> bands = [];
    private readonly Dictionary<short, int> places = [];
    private readonly int endedHours;
    private int lastPlace;
    private bool anyCell;

    /// <param name="context">Plan and moment of judgement.</param>
    /// <param name="names">Names of the fields in this format.</param>
    /// <param name="date">The date, or <c>null</c> when it could not be read, which is a problem already told.</param>
    /// <param name="line">Line of the date, for problems with it.</param>
    public SheetBuilder(SheetContext context, IReadOnlyList<string> names, DateOnly? date, int line)
    {
        (this.context, this.names, this.date) = (context, names, date);
        endedHours = CellGrid.Hours;
        if (date is not { } day)
        {
            return;
        }

        var today = DateOnly.FromDateTime(context.Now.UtcDateTime);
        if (day.Year < 1950 || day > today)
        {
            Problems.Add(line, "date", SheetRule.DateRange, $"{DateText.Format(day)} is not from 1950-01-01 to today, {DateText.Format(today)} (UTC).");
            return;
        }

        var sinceMidnight = context.Now + ClockAllowance - new DateTimeOffset(day.ToDateTime(TimeOnly.MinValue), TimeSpan.Zero);
        endedHours = (int)Math.Min(CellGrid.Hours, Math.Floor(sinceMidnight.TotalHours));
    }

    /// <summary>What was found so far.</summary>
    public ProblemList Problems { get; } = new();

    /// <summary>Judges one cell and keeps it when it is good.</summary>
    /// <param name="line">Its line or place.</param>
    /// <param name="code">Its band code.</param>
    /// <param name="text">The text that the slices point into.</param>
    /// <param name="slices">One per <see cref="SheetField"/>.</param>
    /// <param name="told">Fields whose problem is told already, bit by <see cref="SheetField"/>: the others are judged.</param>
    public void AddCell(int line, ReadOnlySpan<byte> code, ReadOnlySpan<byte> text, ReadOnlySpan<FieldSlice> slices, int told = 0)
    {
        anyCell = true;
        if (Problems.IsFull)
        {
            return;
        }

        var before = Problems.Count;
        Span<int> values = stackalloc int[CellGrid.QuantityCount];
        var hour = IsTold(told, SheetField.Hour) ? 0 : Hour(line, slices[(int)SheetField.Hour].Of(text));
        var place = IsTold(told, SheetField.Band) ? 0 : Place(line, code);
        for (var quantity = Quantity.Sweeps; quantity <= Quantity.Coverage; quantity++)
        {
            var field = SheetFields.FieldOf(quantity);
            values[(int)quantity] = IsTold(told, field) ? CellGrid.Missing : Value(line, quantity, slices[(int)field].Of(text));
        }

        CheckPercentile(line, values, slices[(int)SheetField.Level].Of(text), slices[(int)SheetField.LevelP90].Of(text));
        if (Problems.Count != before || told != 0)
        {
            return;
        }

        var cell = bands[place].Cells.AsSpan(hour * CellGrid.QuantityCount, CellGrid.QuantityCount);
        if (cell[(int)Quantity.Sweeps] != CellGrid.Missing)
        {
            Problems.Add(line, Name(SheetField.Band), SheetRule.CellTwice, $"Hour {hour} of {bands[place].Band.Code} is there already.");
            return;
        }

        values.CopyTo(cell);
    }

    /// <summary>The sheet, or every problem found.</summary>
    /// <param name="warnings">What the text alone can tell.</param>
    public SheetReading Build(IReadOnlyList<SheetWarning> warnings)
    {
        if (!anyCell && Problems.Count == 0)
        {
            Problems.Add(0, "", SheetRule.NoCells, "The sheet holds no cell. A day without observation is not sent at all.");
        }

        return Problems.Count > 0 || date is not { } day
            ? new(null, Problems.Items, warnings)
            : new(new(day, Grid()), [], warnings);
    }

    private static bool IsTold(int told, SheetField field) => (told & (1 << (int)field)) != 0;

    private string Name(SheetField field) => names[(int)field];

    private int Hour(int line, ReadOnlySpan<byte> value)
    {
        if (!DecimalText.TryShort(value, 0, out var hour))
        {
            if (value.IsEmpty)
            {
                Missing(line, SheetField.Hour);
                return 0;
            }

            var number = DecimalText.Read(value, 0);
            hour = number.Status == DecimalStatus.Ok && number.Tail == 0 ? number.Units : -1;
        }

        if (hour is < 0 or >= CellGrid.Hours)
        {
            Problems.Add(line, Name(SheetField.Hour), SheetRule.HourRange, $"{ShownText.Quote(value)} is not a whole hour from 0 to 23.");
            return 0;
        }

        if (hour >= endedHours)
        {
            Problems.Add(line, Name(SheetField.Hour), SheetRule.HourNotEnded, string.Create(
                CultureInfo.InvariantCulture, $"Hour {hour} (UTC) has not ended; it is {context.Now.UtcDateTime:yyyy-MM-dd HH:mm} UTC now."));
        }

        return (int)hour;
    }

    private int Place(int line, ReadOnlySpan<byte> code)
    {
        if (code.IsEmpty)
        {
            Missing(line, SheetField.Band);
            return 0;
        }

        if (!context.Plan.TryGet(code, out var band))
        {
            Problems.Add(line, Name(SheetField.Band), SheetRule.BandUnknown, $"{ShownText.Quote(code)} is not a band of the plan; GET /api/v1/bands lists them.");
            return 0;
        }

        // Rows of one hour name the bands in the same order as those of the hour before; rows of one band come together.
        var next = lastPlace + 1 < bands.Count ? lastPlace + 1 : 0;
        if (next < bands.Count && ReferenceEquals(bands[next].Band, band))
        {
            return lastPlace = next;
        }

        if (!places.TryGetValue(band.Id, out var place))
        {
            place = bands.Count;
            var cells = new int[CellGrid.Hours * CellGrid.QuantityCount];
            cells.AsSpan().Fill(CellGrid.Missing);
            bands.Add((band, cells));
            places.Add(band.Id, place);
        }

        return lastPlace = place;
    }

    private int Value(int line, Quantity quantity, ReadOnlySpan<byte> value)
    {
        var field = SheetFields.FieldOf(quantity);
        if (value.IsEmpty)
        {
            if (SheetFields.IsRequired(field))
            {
                Missing(line, field);
            }

            return CellGrid.Missing;
        }

        var limits = FieldLimits.Of(quantity);
        if (DecimalText.TryShort(value, limits.Decimals, out var units) && units >= limits.Low && units <= limits.High)
        {
            return (int)units;
        }

        var number = DecimalText.Read(value, limits.Decimals);
        if (number.Status == DecimalStatus.Ok)
        {
            if (number.Within(limits.Low, limits.High) && (quantity != Quantity.Sweeps || number.Tail == 0))
            {
                return (int)number.Rounded;
            }

            Problems.Add(line, Name(field), limits.Rule, $"{ShownText.Quote(value)} is not {limits.Allowed}.");
        }
        else if (number.Status == DecimalStatus.NotFinite)
        {
            Problems.Add(line, Name(field), SheetRule.NotFinite, $"{ShownText.Quote(value)} is not a finite number; leave an unknown optional value empty.");
        }
        else
        {
            Problems.Add(line, Name(field), SheetRule.NumberSyntax, $"{ShownText.Quote(value)} is not a number with a decimal point.");
        }

        return CellGrid.Missing;
    }

    // Compared as written. Rounding keeps order, so only values that round to the same have to be looked at again.
    private void CheckPercentile(int line, ReadOnlySpan<int> values, ReadOnlySpan<byte> level, ReadOnlySpan<byte> p90)
    {
        var (low, high) = (values[(int)Quantity.Level], values[(int)Quantity.LevelP90]);
        if (low == CellGrid.Missing || high == CellGrid.Missing || high > low)
        {
            return;
        }

        if (high < low || DecimalReading.Compare(DecimalText.Read(p90, 14), DecimalText.Read(level, 14)) < 0)
        {
            Problems.Add(line, Name(SheetField.LevelP90), SheetRule.P90BelowLevel, $"{ShownText.Quote(p90)} is below the level {ShownText.Quote(level)}.");
        }
    }

    private void Missing(int line, SheetField field) =>
        Problems.Add(line, Name(field), SheetRule.ValueMissing, $"Every cell needs {Name(field)}.");

    private CellGrid Grid()
    {
        var sorted = bands.ToArray();
        Array.Sort(sorted, (a, b) => a.Band.Id.CompareTo(b.Band.Id));
        var planes = new int[]?[CellGrid.QuantityCount];
        for (var quantity = 0; quantity < planes.Length; quantity++)
        {
            var plane = new int[CellGrid.Hours * sorted.Length];
            for (var b = 0; b < sorted.Length; b++)
            {
                var cells = sorted[b].Cells;
                for (int from = quantity, to = b; from < cells.Length; from += CellGrid.QuantityCount, to += sorted.Length)
                {
                    plane[to] = cells[from];
                }
            }

            planes[quantity] = plane.AsSpan().ContainsAnyExcept(CellGrid.Missing) ? plane : null;
        }

        return new([.. sorted.Select(entry => entry.Band.Id)], planes);
    }
}
