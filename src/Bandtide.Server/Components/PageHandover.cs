using Microsoft.Extensions.Caching.Memory;

namespace Bandtide.Server.Components;

/// <summary>Keeps what a page was drawn from for the moment until its circuit opens, so that it is not read and drawn twice.</summary>
/// <remarks>Held in memory, taken once, dropped after half a minute: without it a page reads its data again, no more.</remarks>
internal sealed class PageHandover : IDisposable
{
    private const int MostPages = 256;
    private static readonly TimeSpan Lifetime = TimeSpan.FromSeconds(30);
    private readonly MemoryCache kept = new(new MemoryCacheOptions { SizeLimit = MostPages });

    /// <summary>Keeps a model and gives the name it can be taken by.</summary>
    public string Keep(object model)
    {
        var name = Guid.NewGuid().ToString("N");
        kept.Set(name, model, new MemoryCacheEntryOptions { Size = 1, AbsoluteExpirationRelativeToNow = Lifetime });
        return name;
    }

    /// <summary>Takes a model out, or gives <c>null</c>.</summary>
    public object? Take(string? name)
    {
        if (name is null || !kept.TryGetValue(name, out var model))
        {
            return null;
        }

        kept.Remove(name);
        return model;
    }

    /// <inheritdoc/>
    public void Dispose() => kept.Dispose();
}
