namespace Bandtide.Storage.Keys;

/// <summary>A known key's rights.</summary>
/// <param name="KeyId">Identity of the key, as listed and revoked.</param>
/// <param name="StationId">The only station it may write, or <c>null</c> for a coordinator's key, which may do everything.</param>
/// <param name="LoopbackOnly">Whether it is good from this machine only (the demonstration key).</param>
public sealed record KeyScope(int KeyId, int? StationId, bool LoopbackOnly)
{
    /// <summary>Whether this is a coordinator's key.</summary>
    public bool IsCoordinator => StationId is null;
}
