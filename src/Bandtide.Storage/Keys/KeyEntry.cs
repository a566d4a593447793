namespace Bandtide.Storage.Keys;

/// <summary>A good key as its station's operator sees it; the key itself is nowhere.</summary>
/// <param name="Id">Identity, as revoked.</param>
/// <param name="Note">What it is for.</param>
/// <param name="CreatedAt">When it was made, UTC.</param>
public sealed record KeyEntry(int Id, string Note, DateTimeOffset CreatedAt);
