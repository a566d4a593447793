using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using Microsoft.AspNetCore.WebUtilities;

namespace Bandtide.Server.Components.Hours;

/// <summary>The address of the Hours page: the API's query values, a <c>view</c>, and what its form sends.</summary>
/// <remarks>
/// A form without script sends every field, empty ones too, and one <c>place</c> for station or region. Such an address is
/// read all the same and has a short canonical form.
/// </remarks>
public sealed class HoursAddress
{
    /// <summary>Path of the page.</summary>
    public const string Path = "hours";

    /// <summary>Name of the form's field for a station or region, such as <c>region:all</c>.</summary>
    public const string Place = "place";

    private const string ViewName = "view";
    private static readonly string[] Defaults = ["month", "from", "to", "season", "years"];
    private readonly Dictionary<string, string[]> values;

    private HoursAddress(Dictionary<string, string[]> values, YearMonth newest, bool isFromForm)
    {
        (this.values, Newest, IsFromForm) = (values, newest, isFromForm);
        if (!values.ContainsKey("station") && !values.ContainsKey("region"))
        {
            values["region"] = ["all"];
        }

        if (!Defaults.Any(values.ContainsKey))
        {
            values["month"] = [newest.ToString()];
        }

        Query = HeatmapQueryText.Parse(name => values.GetValueOrDefault(name, []), out var problems);
        Problems = problems;
        Shown = Value(ViewName) switch { "table" => HoursView.Table, "year" => HoursView.Year, _ => HoursView.Picture };
    }

    /// <summary>The query, or <c>null</c> where there are problems.</summary>
    public HeatmapQuery? Query { get; }

    /// <summary>What is wrong with the address.</summary>
    public IReadOnlyList<QueryProblem> Problems { get; }

    /// <summary>How the answer is shown.</summary>
    public HoursView Shown { get; }

    /// <summary>The month shown where none is named.</summary>
    public YearMonth Newest { get; }

    /// <summary>Whether a form without script made it, so that the short form has to replace it.</summary>
    public bool IsFromForm { get; }

    /// <summary>The short address, relative to the site.</summary>
    public string Canonical => Query is { } query ? Of(query, Shown) : Raw();

    /// <summary>Reads a page's address.</summary>
    /// <param name="uri">Absolute address.</param>
    /// <param name="newest">The month shown where none is named.</param>
    public static HoursAddress Parse(string uri, YearMonth newest)
    {
        var read = new Dictionary<string, string[]>(StringComparer.Ordinal);
        var isFromForm = false;
        foreach (var (name, texts) in QueryHelpers.ParseQuery(new Uri(uri).Query))
        {
            var given = texts.OfType<string>().Where(text => text.Length > 0).ToArray();
            isFromForm |= given.Length < texts.Count || string.Equals(name, Place, StringComparison.Ordinal);
            if (given.Length > 0)
            {
                read[name] = given;
            }
        }

        Split(read);
        return new(read, newest, isFromForm);
    }

    /// <summary>The address of a query.</summary>
    public static string Of(HeatmapQuery query, HoursView view = HoursView.Picture) =>
        $"{Path}?{HeatmapQueryText.ToQueryString(query)}{view switch { HoursView.Table => "&view=table", HoursView.Year => "&view=year", _ => "" }}";

    /// <summary>What a value of the address says, or <c>null</c>.</summary>
    public string? Value(string name) => values.TryGetValue(name, out var given) ? given[0] : null;

    /// <summary>The address with one value changed, short where it can be.</summary>
    public HoursAddress With(string name, string? text)
    {
        var changed = new Dictionary<string, string[]>(values, StringComparer.Ordinal);
        changed.Remove(name);
        if (!string.IsNullOrEmpty(text))
        {
            changed[name] = [text];
        }

        Split(changed);
        return new(changed, Newest, isFromForm: false);
    }

    private static void Split(Dictionary<string, string[]> values)
    {
        if (!values.Remove(Place, out var places))
        {
            return;
        }

        values.Remove("station");
        values.Remove("region");
        var parts = places[0].Split(':', 2);
        if (parts.Length == 2 && parts[0] is ("station" or "region"))
        {
            values[parts[0]] = [parts[1]];
        }
    }

    private string Raw() =>
        QueryHelpers.AddQueryString(Path, values.SelectMany(pair => pair.Value.Select(text => KeyValuePair.Create(pair.Key, (string?)text))));
}
