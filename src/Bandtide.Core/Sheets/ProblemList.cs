namespace Bandtide.Core.Sheets;

/// <summary>Collects problems up to the number that an answer tells.</summary>
internal sealed class ProblemList
{
    /// <summary>More than this are not told.</summary>
    public const int Max = 100;

    private readonly List<SheetProblem> items = [];

    public IReadOnlyList<SheetProblem> Items => items;

    public int Count => items.Count;

    public bool IsFull => items.Count == Max;

    public void Add(int line, string field, string rule, string message)
    {
        if (!IsFull)
        {
            items.Add(new(line, field, rule, message));
        }
    }
}
