namespace Bandtide.Core.Bands;

/// <summary>One reason why a band cannot join a plan.</summary>
/// <param name="Code">Code of the refused band as given.</param>
/// <param name="Rule">The broken rule, in the words of an identifier: <c>code</c>, <c>duplicate</c>, <c>id</c>, <c>name</c>,
/// <c>layer</c>, <c>segments</c>, <c>range</c>, <c>overlap</c>.</param>
/// <param name="Message">The reason in a sentence.</param>
public sealed record BandPlanProblem(string Code, string Rule, string Message);
