using Bandtide.Core.Sheets;

namespace Bandtide.Server.Api;

/// <summary>A refused day of a bulk upload.</summary>
/// <param name="Date">The date as it was written, or the unreadable text.</param>
/// <param name="Status"><c>refused</c>.</param>
/// <param name="Errors">Every error found, up to 100.</param>
public sealed record RefusedDayAnswer(string Date, string Status, IReadOnlyList<SheetProblem> Errors);
