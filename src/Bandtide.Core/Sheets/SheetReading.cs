namespace Bandtide.Core.Sheets;

/// <summary>What reading a body gave: a sheet, or every problem found (up to 100).</summary>
/// <param name="Sheet">The sheet, or <c>null</c> when it is refused.</param>
/// <param name="Problems">Empty exactly when <paramref name="Sheet"/> is there.</param>
/// <param name="Warnings">What only the text can tell, such as unknown columns.</param>
public sealed record SheetReading(DaySheet? Sheet, IReadOnlyList<SheetProblem> Problems, IReadOnlyList<SheetWarning> Warnings);
