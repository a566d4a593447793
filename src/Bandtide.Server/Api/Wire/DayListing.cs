namespace Bandtide.Server.Api;

/// <summary>A stored day without its cells.</summary>
/// <param name="Date">UTC date.</param>
/// <param name="Revision">Its current revision.</param>
/// <param name="Checksum">Equal exactly when the rounded cells are.</param>
/// <param name="Cells">Number of cells.</param>
public sealed record DayListing(string Date, int Revision, string Checksum, int Cells);
