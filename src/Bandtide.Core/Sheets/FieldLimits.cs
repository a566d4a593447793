namespace Bandtide.Core.Sheets;

/// <summary>Range of a quantity in whole units of its resolution, both ends included, and the rule that keeps it.</summary>
internal sealed record FieldLimits(int Low, int High, int Decimals, string Rule, string Allowed)
{
    private static readonly FieldLimits Share = new(0, 10_000, 4, SheetRule.ShareRange, "a share from 0 to 1");

    private static readonly FieldLimits Decibels =
        new(-SheetFields.MaxDecibels * 100, SheetFields.MaxDecibels * 100, 2, SheetRule.DecibelRange, "from -300 to 300 dB");

    private static readonly FieldLimits[] ByQuantity =
    [
        new(1, SheetFields.MaxSweeps, 0, SheetRule.SweepsRange, "a whole number from 1 to 1000000"),
        Share, Decibels, Decibels, Decibels, Decibels, Share, Share,
    ];

    /// <summary>The limits of a quantity.</summary>
    public static FieldLimits Of(Quantity quantity) => ByQuantity[(int)quantity];
}
