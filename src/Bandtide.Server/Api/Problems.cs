using Bandtide.Core.Heatmaps;
using Bandtide.Core.Sheets;
using Microsoft.AspNetCore.WebUtilities;

namespace Bandtide.Server.Api;

/// <summary>The one way to answer that something is wrong.</summary>
internal static class Problems
{
    public const string ContentType = "application/problem+json";

    public static IResult Of(int status, string detail, IReadOnlyList<SheetProblem>? errors = null) =>
        Results.Json(Details(status, detail, errors), contentType: ContentType, statusCode: status);

    public static ApiProblem Details(int status, string detail, IReadOnlyList<SheetProblem>? errors = null) => new()
    {
        Type = "about:blank",
        Status = status,
        Title = ReasonPhrases.GetReasonPhrase(status),
        Detail = detail,
        Errors = errors ?? [],
    };

    public static IResult Bad(string field, string rule, string message) => Bad([new SheetProblem(0, field, rule, message)]);

    public static IResult Bad(IReadOnlyList<SheetProblem> errors) => Of(
        StatusCodes.Status400BadRequest,
        errors.Count == 1 ? errors[0].Message : $"{errors.Count} errors were found; the first: {errors[0].Message}",
        errors);

    public static IResult Bad(IReadOnlyList<QueryProblem> problems) =>
        Bad([.. problems.Select(problem => new SheetProblem(0, problem.Field, problem.Rule, problem.Message))]);

    public static IResult NotFound(string detail) => Of(StatusCodes.Status404NotFound, detail);

    public static IResult Gone(string detail) => Of(StatusCodes.Status410Gone, detail);

    public static IResult Forbidden() =>
        Of(StatusCodes.Status403Forbidden, "The key is good, but not for this: a station's key writes its own station only.");

    public static IResult NotAcceptable(string offered) =>
        Of(StatusCodes.Status406NotAcceptable, $"None of the asked representations can be made; there is {offered}.");
}
