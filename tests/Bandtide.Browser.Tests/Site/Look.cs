namespace Bandtide.Browser.Tests.Site;

/// <summary>How a reader looks at the pages.</summary>
/// <param name="Width">Width of the window, CSS pixels.</param>
/// <param name="IsDark">Whether the reader prefers dark pages.</param>
/// <param name="HasScript">Whether script runs.</param>
public sealed record Look(int Width, bool IsDark = false, bool HasScript = true)
{
    public static Look Desk { get; } = new(1280);

    public static Look Dark { get; } = new(1280, IsDark: true);

    public static Look Phone { get; } = new(360);

    public static Look NoScript { get; } = new(1280, HasScript: false);
}
