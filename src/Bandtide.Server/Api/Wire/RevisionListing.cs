namespace Bandtide.Server.Api;

/// <summary>One revision of a day.</summary>
/// <param name="Revision">From 1.</param>
/// <param name="ReceivedAt">When it was stored, UTC.</param>
/// <param name="Status"><c>stored</c> or <c>withdrawn</c>.</param>
/// <param name="Cells">Number of cells; 0 for a withdrawal.</param>
/// <param name="Checksum">Checksum of the cells; <c>null</c> for a withdrawal.</param>
public sealed record RevisionListing(int Revision, DateTimeOffset ReceivedAt, string Status, int Cells, string? Checksum);
