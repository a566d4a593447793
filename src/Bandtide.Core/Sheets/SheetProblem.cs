namespace Bandtide.Core.Sheets;

/// <summary>One reason why a day is refused.</summary>
/// <param name="Line">CSV: the line, the header being 1. JSON: the cell's place from 1. 0 when it concerns the whole body.</param>
/// <param name="Field">The field as the contract names it in that format (<c>level_p90</c> or <c>levelP90</c>), or empty.</param>
/// <param name="Rule">The rule's code, one of the constants in <c>SheetRule</c>.</param>
/// <param name="Message">A sentence for people, with the value found and what is allowed.</param>
public sealed record SheetProblem(int Line, string Field, string Rule, string Message);
