using System.Globalization;
using Bandtide.Core;
using Bandtide.Core.Sheets;
using Bandtide.Core.Time;

namespace Bandtide.Server.Api;

/// <summary>Collects what is wrong with the fields of an object.</summary>
internal sealed class FieldCheck
{
    private readonly List<SheetProblem> problems = [];

    public IResult? Problem => problems.Count == 0 ? null : Problems.Bad(problems);

    public void Add(string field, string rule, string message) => problems.Add(new(0, field, rule, message));

    public void Code(string field, string? code)
    {
        if (code is null || !Codes.IsValid(code))
        {
            Add(field, "code-syntax", "A code is 2 to 24 of a-z, 0-9 and -.");
        }
    }

    public DateOnly? Date(string field, string? text)
    {
        if (string.IsNullOrEmpty(text))
        {
            return null;
        }

        if (DateText.TryParse(text, out var date))
        {
            return date;
        }

        Add(field, SheetRule.DateSyntax, $"{field} must be a date, yyyy-MM-dd.");
        return null;
    }

    public void Text(string field, string? text, int longest, bool required = false)
    {
        if (required && string.IsNullOrWhiteSpace(text))
        {
            Add(field, SheetRule.ValueMissing, $"{field} is missing.");
        }
        else if (text is not null && (text.Length > longest || text.Any(char.IsControl)))
        {
            Add(field, "text-syntax", $"{field} holds at most {longest} characters on one line.");
        }
    }

    public void Range(string field, double? value, double low, double high, bool required = false)
    {
        if (value is null ? required : !(value >= low && value <= high))
        {
            Add(field, value is null ? SheetRule.ValueMissing : "range", string.Create(
                CultureInfo.InvariantCulture, $"{field} must be a number from {low} to {high}."));
        }
    }

    public void OneOf(string field, string? value, IReadOnlyList<string> allowed, bool required = false)
    {
        if (value is null ? required : !allowed.Contains(value, StringComparer.Ordinal))
        {
            Add(field, value is null ? SheetRule.ValueMissing : "choice", $"{field} must be one of {string.Join(", ", allowed)}.");
        }
    }
}
