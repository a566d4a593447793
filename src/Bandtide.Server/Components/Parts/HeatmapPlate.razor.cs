using Bandtide.Server.Figures;
using Microsoft.AspNetCore.Components;
using Microsoft.JSInterop;
using Plotly.Blazor;

namespace Bandtide.Server.Components.Parts;

/// <summary>A heatmap on a page.</summary>
public sealed partial class HeatmapPlate(IJSRuntime script) : ComponentBase, IAsyncDisposable
{
    private readonly Config config = HeatmapPlotly.Config();
    private IJSObjectReference? module;
    private IJSObjectReference? watch;
    private DotNetObjectReference<HeatmapPlate>? self;
    private HeatmapFigure? shown;
    private MarkupString picture;
    private PageInk? ink;
    private IList<ITrace> traces = [];
    private Layout layout = new();
    private PlotlyChart? chart;
    private ElementReference live;
    private bool isDrawn;
    private bool isStale;

    /// <summary>Identity on the page: letters and digits.</summary>
    [Parameter]
    public string Id { get; set; } = "heatmap";

    /// <summary>What to draw; another object is another picture.</summary>
    [Parameter, EditorRequired]
    public HeatmapFigure Figure { get; set; } = default!;

    /// <summary>Whether place and period stand in the caption; not needed where the page's head says them.</summary>
    [Parameter]
    public bool ShowsSubtitle { get; set; } = true;

    /// <summary>Called by the page's script when it turns dark or light.</summary>
    [JSInvokable]
    public async Task InkTurnedAsync()
    {
        ink = await module!.InvokeAsync<PageInk>("ink");
        Describe();
        StateHasChanged();
    }

    /// <inheritdoc/>
    public async ValueTask DisposeAsync()
    {
        try
        {
            if (watch is not null)
            {
                await watch.InvokeVoidAsync("stop");
                await watch.DisposeAsync();
            }

            if (module is not null)
            {
                await module.DisposeAsync();
            }
        }
        catch (JSDisconnectedException)
        {
            // The circuit is gone, and the page's script with it.
        }

        self?.Dispose();
    }

    /// <inheritdoc/>
    protected override void OnParametersSet()
    {
        if (ReferenceEquals(Figure, shown))
        {
            return;
        }

        shown = Figure;
        picture = new(Figure.Rows.Count > 0 ? HeatmapSvg.RenderInline(Figure, Id) : "");
        if (ink is not null)
        {
            Describe();
        }
    }

    /// <inheritdoc/>
    protected override async Task OnAfterRenderAsync(bool firstRender)
    {
        if (firstRender)
        {
            module = await script.InvokeAsync<IJSObjectReference>("import", "/js/figures.js");
            self = DotNetObjectReference.Create(this);
            watch = await module.InvokeAsync<IJSObjectReference>("watchInk", self);
            ink = await module.InvokeAsync<PageInk>("ink");
            Describe();
            isStale = false;
            StateHasChanged();
        }
        else if (isStale && chart is not null)
        {
            isStale = false;
            await chart.React();
        }
    }

    private void Describe()
    {
        (traces, layout) = (HeatmapPlotly.Traces(Figure, ink!), HeatmapPlotly.Layout(Figure, ink!));
        isStale = true;
    }

    // The chart says that it was handed over, not that it was painted.
    private void WaitForDrawing()
    {
        if (!isDrawn)
        {
            _ = InvokeAsync(async () =>
            {
                isDrawn = await module!.InvokeAsync<bool>("drawn", live);
                StateHasChanged();
            });
        }
    }
}
