namespace Bandtide.Server.Api;

/// <summary>A new key; its text is shown this once.</summary>
/// <param name="Id">Identity by which it is revoked.</param>
/// <param name="Key">The key.</param>
public sealed record KeyAnswer(int Id, string Key);
