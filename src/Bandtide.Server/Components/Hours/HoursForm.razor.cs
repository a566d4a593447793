using Bandtide.Core.Heatmaps;
using Bandtide.Core.Time;
using Bandtide.Server.Figures;
using Bandtide.Storage.Network;
using Microsoft.AspNetCore.Components;

namespace Bandtide.Server.Components.Hours;

/// <summary>What a reader can choose on the Hours page.</summary>
public sealed partial class HoursForm : ComponentBase
{
    private static readonly string[] FineChoices = ["mindays", "minsweeps", "vote", "align"];

    /// <summary>The present choices.</summary>
    [Parameter, EditorRequired]
    public HoursAddress Address { get; set; } = default!;

    /// <summary>The regions and stations to choose from.</summary>
    [Parameter, EditorRequired]
    public NetworkView Network { get; set; } = default!;

    /// <summary>Told the new address, relative to the site, when a choice changes.</summary>
    [Parameter, EditorRequired]
    public Action<string> Changed { get; set; } = default!;

    private string Kind => (Address.Value("from") ?? Address.Value("to")) is not null ? "range"
        : (Address.Value("season") ?? Address.Value("years")) is not null ? "season"
        : "month";

    private string PlaceValue => Address.Value("station") is { } station ? $"station:{station}" : $"region:{Address.Value("region")}";

    private bool HasFineChoices => FineChoices.Any(name => Address.Value(name) is not null);

    private YearMonth Last => Address.Query?.Period switch
    {
        Period.Months months => months.To,
        Period.SeasonOf { ToYear: { } year } season => Seasons.Months(season.Season, year, Hemisphere.North)[^1],
        _ => YearMonth.TryParse(Address.Value("month") ?? Address.Value("to"), out var month) ? month : Address.Newest,
    };

    private string MonthAddress => Of(new Period.Months(Last, Last));

    private string RangeAddress => Of(new Period.Months(Last.AddMonths(-2), Last));

    private string SeasonAddress
    {
        get
        {
            var (season, year) = Seasons.Of(Last, Hemisphere.North);
            return Of(new Period.SeasonOf(season, year, year));
        }
    }

    private string? Value(string name) => Address.Value(name);

    private string Of(Period period) => HoursAddress.Of((Address.Query ?? new HeatmapQuery(null, "all", period)) with { Period = period }, Address.Shown);

    private void Change(string name, ChangeEventArgs change) => Changed(Address.With(name, change.Value as string).Canonical);

    private void ChangePlace(string place) => Changed(Address.With(HoursAddress.Place, place).Canonical);

    // Every change is shown already; the button is for those who look for one.
    private void Submit() => Changed(Address.Canonical);

    private RenderFragment MonthField(string name, string label) => builder =>
    {
        builder.OpenElement(0, "div");
        builder.AddAttribute(1, "class", "field half");
        builder.OpenElement(2, "label");
        builder.AddAttribute(3, "for", name);
        builder.AddContent(4, label);
        builder.CloseElement();
        builder.OpenElement(5, "input");
        builder.AddAttribute(6, "id", name);
        builder.AddAttribute(7, "name", name);
        builder.AddAttribute(8, "type", "month");
        builder.AddAttribute(9, "required", true);
        builder.AddAttribute(10, "pattern", @"\d{4}-\d{2}");
        builder.AddAttribute(11, "value", YearMonth.TryParse(Address.Value(name), out var month) ? month.ToString() : null);
        builder.AddAttribute(12, "onchange", EventCallback.Factory.Create<ChangeEventArgs>(this, change => Change(name, change)));
        builder.CloseElement();
        builder.CloseElement();
    };
}
