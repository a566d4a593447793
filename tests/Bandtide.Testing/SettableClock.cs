namespace Bandtide.Testing;

/// <summary>A clock that stands where a test puts it.</summary>
public sealed class SettableClock(DateTimeOffset now) : TimeProvider
{
    /// <summary>The moment it shows.</summary>
    public DateTimeOffset Now { get; set; } = now;

    public override DateTimeOffset GetUtcNow() => Now;
}
