namespace Bandtide.Server.Api;

/// <summary>A good key as its operator sees it.</summary>
/// <param name="Id">Identity by which it is revoked.</param>
/// <param name="Note">What it is for.</param>
/// <param name="CreatedAt">When it was made, UTC.</param>
public sealed record KeyListing(int Id, string Note, DateTimeOffset CreatedAt);
