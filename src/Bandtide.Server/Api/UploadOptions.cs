using System.ComponentModel.DataAnnotations;

namespace Bandtide.Server.Api;

/// <summary>How patient bulk uploads are: section <c>Uploads</c> of the configuration.</summary>
public sealed class UploadOptions
{
    /// <summary>
    /// Seconds without a byte after which the server gives up: on a sender in the middle of a body, and on a reader of the
    /// answer once the body has ended. Default 120.
    /// </summary>
    [Range(1, 3600, ErrorMessage = "Uploads:SilenceSeconds must be from {1} to {2}.")]
    public int SilenceSeconds { get; init; } = 120;

    internal TimeSpan Silence => TimeSpan.FromSeconds(SilenceSeconds);
}
