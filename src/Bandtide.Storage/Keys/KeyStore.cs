namespace Bandtide.Storage.Keys;

/// <summary>Keys: random, stored as SHA-256 alone, compared in constant time.</summary>
public sealed class KeyStore
{
    /// <summary>Makes a key and returns its text, which is never seen again.</summary>
    /// <param name="stationId">Its station, or <c>null</c> for a coordinator's key.</param>
    /// <param name="note">What it is for.</param>
    /// <param name="ct">Cancels.</param>
    public Task<(KeyScope Scope, string Key)> IssueAsync(int? stationId, string note, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>Makes a given text a key (set-up and demonstration). Idempotent.</summary>
    public Task<KeyScope> EnsureAsync(string key, int? stationId, bool loopbackOnly, string note, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>The rights of a presented key, or <c>null</c> when it is unknown or revoked.</summary>
    public Task<KeyScope?> FindAsync(string presented, CancellationToken ct) => throw new NotSupportedException("Not built yet.");

    /// <summary>Revokes a key of a station; false when the station has no such key.</summary>
    public Task<bool> RevokeAsync(int stationId, int keyId, CancellationToken ct) => throw new NotSupportedException("Not built yet.");
}
