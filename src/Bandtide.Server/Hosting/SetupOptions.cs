using System.ComponentModel.DataAnnotations;

namespace Bandtide.Server.Hosting;

/// <summary>How the first coordinator comes in: section <c>Setup</c> of the configuration.</summary>
public sealed class SetupOptions
{
    /// <summary>A coordinator's key made at start, at least 32 characters. Default none: the first start prints a link.</summary>
    [MinLength(32, ErrorMessage = "Setup:CoordinatorKey must have at least 32 characters.")]
    public string? CoordinatorKey { get; init; }
}
