using System.Globalization;
using Bandtide.Core.Time;
using Bandtide.Server.Components.Hours;
using Microsoft.AspNetCore.WebUtilities;

namespace Bandtide.Server.Components.Reports;

/// <summary>The address of the Coverage page: a station or region, and a month or a year.</summary>
/// <param name="Station">Code of a station, or <c>null</c> when a region is asked for.</param>
/// <param name="Region">Code of a region.</param>
/// <param name="Month">The month; of a year, any of it.</param>
/// <param name="IsYear">Whether the whole year is asked for.</param>
/// <param name="Page">Which hundred of the stations, from 1.</param>
public sealed record CoverageAddress(string? Station, string? Region, YearMonth Month, bool IsYear, int Page)
{
    /// <summary>Path of the page.</summary>
    public const string Path = "coverage";

    /// <summary>First month of the period.</summary>
    public YearMonth From => IsYear ? new(Month.Year, 1) : Month;

    /// <summary>Last month of the period.</summary>
    public YearMonth To => IsYear ? new(Month.Year, 12) : Month;

    /// <summary>The value of the form's field for a station or region.</summary>
    public string Place => Station is null ? $"region:{Region}" : $"station:{Station}";

    /// <summary>The address, relative to the site.</summary>
    public string Text => $"{Path}?{Selection}&{(IsYear ? $"year={Year}" : $"month={Month}")}{(Page > 1 ? string.Create(CultureInfo.InvariantCulture, $"&page={Page}") : "")}";

    /// <summary>The same numbers from the programming interface.</summary>
    public string Csv => $"api/v1/coverage?{Selection}&{(IsYear ? $"from={From}&to={To}" : $"month={Month}")}&format=csv";

    /// <summary>The year as text.</summary>
    public string Year => Month.Year.ToString("0000", CultureInfo.InvariantCulture);

    private string Selection => Station is null ? $"region={Region}" : $"station={Station}";

    /// <summary>Reads an address; what is missing or unreadable gets its default.</summary>
    /// <param name="uri">Absolute address.</param>
    /// <param name="newest">The month shown where none is named.</param>
    public static CoverageAddress Parse(string uri, YearMonth newest)
    {
        var values = QueryHelpers.ParseQuery(new Uri(uri).Query);
        string? Value(string name) => values.TryGetValue(name, out var text) && text.ToString() is { Length: > 0 } given ? given : null;

        var (station, region) = Value(HoursAddress.Place)?.Split(':', 2) switch
        {
            ["station", var code] => (code, null),
            ["region", var code] => ((string?)null, code),
            _ => (Value("station"), Value("region")),
        };
        var page = int.TryParse(Value("page"), NumberStyles.None, CultureInfo.InvariantCulture, out var number) && number > 0 ? number : 1;
        return Value("year") is { } year && YearMonth.TryParse($"{year}-01", out var january)
            ? new(station, station is null ? region ?? "all" : null, january, true, page)
            : new(station, station is null ? region ?? "all" : null, YearMonth.TryParse(Value("month"), out var month) ? month : newest, false, page);
    }
}
