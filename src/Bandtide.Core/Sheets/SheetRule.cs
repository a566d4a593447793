namespace Bandtide.Core.Sheets;

/// <summary>The codes of every rule a day sheet is judged by.</summary>
public static class SheetRule
{
    /// <summary>Hour is a whole number from 0 to 23.</summary>
    public const string HourRange = "hour-range";

    /// <summary>Band is a code of the plan.</summary>
    public const string BandUnknown = "band-unknown";

    /// <summary>Sweeps is a whole number from 1 to 1,000,000.</summary>
    public const string SweepsRange = "sweeps-range";

    /// <summary>Occupancy, steady and coverage lie from 0 to 1.</summary>
    public const string ShareRange = "share-range";

    /// <summary>Decibel values lie from -300 to 300.</summary>
    public const string DecibelRange = "decibel-range";

    /// <summary>level_p90 is not below level.</summary>
    public const string P90BelowLevel = "p90-below-level";

    /// <summary>No hour and band twice.</summary>
    public const string CellTwice = "cell-twice";

    /// <summary>A value that every cell needs is missing.</summary>
    public const string ValueMissing = "value-missing";

    /// <summary>A number is a plain decimal number.</summary>
    public const string NumberSyntax = "number-syntax";

    /// <summary>NaN and infinity are refused.</summary>
    public const string NotFinite = "not-finite";

    /// <summary>A date is written yyyy-MM-dd.</summary>
    public const string DateSyntax = "date-syntax";

    /// <summary>A date is neither before 1950 nor after today (UTC).</summary>
    public const string DateRange = "date-range";

    /// <summary>The date in the body is the date in the address.</summary>
    public const string DateMismatch = "date-mismatch";

    /// <summary>A date comes in one run of rows only.</summary>
    public const string DateAgain = "date-again";

    /// <summary>An hour has ended, with five minutes' allowance for clocks.</summary>
    public const string HourNotEnded = "hour-not-ended";

    /// <summary>A CSV body begins with a header line.</summary>
    public const string HeaderMissing = "header-missing";

    /// <summary>The header names every required column.</summary>
    public const string ColumnMissing = "column-missing";

    /// <summary>The header names no column twice; a JSON cell no field twice.</summary>
    public const string ColumnTwice = "column-twice";

    /// <summary>Warning: a column or field that the contract does not know was ignored.</summary>
    public const string ColumnUnknown = "column-unknown";

    /// <summary>A row has as many fields as the header.</summary>
    public const string FieldCount = "field-count";

    /// <summary>A quoted field follows RFC 4180.</summary>
    public const string QuoteSyntax = "quote-syntax";

    /// <summary>Every quote is closed.</summary>
    public const string QuoteUnclosed = "quote-unclosed";

    /// <summary>The body is UTF-8.</summary>
    public const string Utf8 = "utf8";

    /// <summary>The body is JSON as RFC 8259 has it, in the contract's shape.</summary>
    public const string JsonSyntax = "json-syntax";

    /// <summary>A sheet holds at least one cell.</summary>
    public const string NoCells = "no-cells";

    /// <summary>One day's text takes at most 2 MB.</summary>
    public const string DayTooLarge = "day-too-large";

    /// <summary>One body holds at most 4,000 days.</summary>
    public const string TooManyDays = "too-many-days";

    /// <summary>The body ended in the middle of the day.</summary>
    public const string BodyIncomplete = "body-incomplete";

    /// <summary>Warning: signal is below level.</summary>
    public const string SignalBelowLevel = "signal-below-level";

    /// <summary>Warning: level is above the threshold though under half is occupied.</summary>
    public const string LevelAboveThreshold = "level-above-threshold";

    /// <summary>Warning: the station has told no setup.</summary>
    public const string NoSetup = "no-setup";

    /// <summary>Warning: the date lies before the station's first setup.</summary>
    public const string BeforeFirstSetup = "before-first-setup";

    /// <summary>Warning: the cells equal those of an earlier day.</summary>
    public const string CopiedDay = "copied-day";
}
