namespace Bandtide.Core.Sheets;

/// <summary>Suspicious but possible content that was stored all the same: one entry per rule.</summary>
/// <param name="Rule">The rule's code, one of the constants in <c>SheetRule</c>.</param>
/// <param name="Count">Number of cells concerned, or 1 when it concerns the day.</param>
/// <param name="Hour">Hour of the first cell concerned, if any.</param>
/// <param name="Band">Band code of the first cell concerned, if any.</param>
/// <param name="Message">A sentence for people.</param>
public sealed record SheetWarning(string Rule, int Count, int? Hour, string? Band, string Message);
