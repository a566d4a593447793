namespace Bandtide.Core.Heatmaps;

/// <summary>One reason why a query cannot be answered.</summary>
/// <param name="Field">Name of the query value.</param>
/// <param name="Rule">Code of the rule.</param>
/// <param name="Message">A sentence for people, with the value found and what is allowed.</param>
public sealed record QueryProblem(string Field, string Rule, string Message);
