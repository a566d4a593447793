using System.ComponentModel.DataAnnotations;

namespace Bandtide.Server.Security;

/// <summary>How many requests are let through: section <c>RateLimits</c> of the configuration.</summary>
public sealed class RateLimitOptions
{
    /// <summary>Requests a second with one key. Default 1000.</summary>
    [Range(1, 1_000_000, ErrorMessage = "RateLimits:KeyPerSecond must be from {1} to {2}.")]
    public int KeyPerSecond { get; init; } = 1000;

    /// <summary>Requests at once with one key after a rest. Default 5000.</summary>
    [Range(1, 10_000_000, ErrorMessage = "RateLimits:KeyBurst must be from {1} to {2}.")]
    public int KeyBurst { get; init; } = 5000;

    /// <summary>Refused keys a second from one address. Default 10.</summary>
    [Range(1, 1_000_000, ErrorMessage = "RateLimits:FailuresPerSecond must be from {1} to {2}.")]
    public int FailuresPerSecond { get; init; } = 10;

    /// <summary>Refused keys at once from one address after a rest. Default 1000.</summary>
    [Range(1, 10_000_000, ErrorMessage = "RateLimits:FailureBurst must be from {1} to {2}.")]
    public int FailureBurst { get; init; } = 1000;
}
