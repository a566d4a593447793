namespace Bandtide.Storage.Model;

/// <summary>A key's hash and rights. The key itself is nowhere.</summary>
internal sealed class AccessKeyRow
{
    public int Id { get; set; }

    /// <summary>The first eight bytes of <see cref="Hash"/>, big-endian: what the index holds.</summary>
    public long Lookup { get; set; }

    /// <summary>SHA-256 of the key's UTF-8 text.</summary>
    public required byte[] Hash { get; set; }

    /// <summary><c>null</c> for a coordinator's key.</summary>
    public int? StationId { get; set; }

    public bool LoopbackOnly { get; set; }
    public required string Note { get; set; }

    /// <summary>Unix milliseconds, UTC.</summary>
    public long CreatedAt { get; set; }

    /// <summary>Unix milliseconds, UTC; <c>null</c> while the key is good.</summary>
    public long? RevokedAt { get; set; }
}
