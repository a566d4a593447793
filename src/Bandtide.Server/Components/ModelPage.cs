using Microsoft.AspNetCore.Components;
using Microsoft.AspNetCore.Components.Routing;

namespace Bandtide.Server.Components;

/// <summary>A page that is drawn from one model, read for its address and read again when the address changes.</summary>
/// <remarks>The model is an <see cref="object"/> here since pages are public classes and what they show is not.</remarks>
public abstract class ModelPage : ComponentBase, IDisposable
{
    private readonly CancellationTokenSource left = new();
    private string? shownAddress;

    /// <summary>Name of the model that was kept when the page was drawn first; carried to the circuit by the page itself.</summary>
    [PersistentState]
    public string? KeptModel { get; set; }

    /// <summary>What the page shows, or <c>null</c> while it is being read for the first time.</summary>
    protected object? Model { get; private set; }

    /// <summary>Whether a newer model is being read.</summary>
    protected bool IsReading { get; private set; }

    /// <summary>Addresses and moves between them.</summary>
    [Inject]
    protected NavigationManager Navigation { get; set; } = default!;

    [Inject]
    private IServiceProvider Services { get; set; } = default!;

    private PageHandover Handover => Services.GetRequiredService<PageHandover>();

    /// <inheritdoc/>
    public void Dispose()
    {
        Dispose(disposing: true);
        GC.SuppressFinalize(this);
    }

    /// <summary>Reads what the page shows at its present address; <c>null</c> when there is no such page.</summary>
    protected abstract Task<object?> ReadAsync(CancellationToken ct);

    /// <inheritdoc/>
    protected override void OnInitialized() => Navigation.LocationChanged += OnLocationChanged;

    /// <inheritdoc/>
    protected override async Task OnParametersSetAsync()
    {
        if (shownAddress is null && RendererInfo.IsInteractive && Handover.Take(KeptModel) is { } kept)
        {
            (Model, shownAddress) = (kept, Navigation.Uri);
            return;
        }

        await ShowAsync();
        if (!RendererInfo.IsInteractive && Model is not null)
        {
            KeptModel = Handover.Keep(Model);
        }
    }

    /// <summary>Gives back what the page holds.</summary>
    protected virtual void Dispose(bool disposing)
    {
        if (disposing)
        {
            Navigation.LocationChanged -= OnLocationChanged;
            left.Cancel();
            left.Dispose();
        }
    }

    // Reads the model for the address, unless it is the one shown.
    private async Task ShowAsync()
    {
        var address = Navigation.Uri;
        if (string.Equals(address, shownAddress, StringComparison.Ordinal))
        {
            return;
        }

        (shownAddress, IsReading) = (address, true);
        try
        {
            var model = await ReadAsync(left.Token);

            // The reader may have gone on while this was being read.
            if (string.Equals(address, shownAddress, StringComparison.Ordinal))
            {
                (Model, IsReading) = (model, false);
                if (model is null)
                {
                    Navigation.NotFound();
                }
            }
        }
        catch (OperationCanceledException) when (left.IsCancellationRequested)
        {
            // The reader has left the page.
        }
    }

    private void OnLocationChanged(object? sender, LocationChangedEventArgs change)
    {
        if (PathOf(change.Location).Equals(PathOf(shownAddress ?? change.Location), StringComparison.Ordinal))
        {
            _ = InvokeAsync(async () =>
            {
                await ShowAsync();
                StateHasChanged();
            });
        }
    }

    private static string PathOf(string address) => new Uri(address).AbsolutePath;
}
