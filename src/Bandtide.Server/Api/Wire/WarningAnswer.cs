namespace Bandtide.Server.Api;

/// <summary>Suspicious but possible content that was stored.</summary>
/// <param name="Rule">Code of the rule.</param>
/// <param name="Count">Number of cells concerned.</param>
/// <param name="Hour">Hour of the first, or <c>null</c> when it concerns the day.</param>
/// <param name="Band">Band of the first, or <c>null</c> when it concerns the day.</param>
/// <param name="Message">A sentence.</param>
public sealed record WarningAnswer(string Rule, int Count, int? Hour, string? Band, string Message);
