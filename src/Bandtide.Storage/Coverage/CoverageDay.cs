namespace Bandtide.Storage.Coverage;

/// <summary>What a station reported for one date, without the values.</summary>
/// <param name="HoursMask">Hours with at least one cell, bit h for UTC hour h.</param>
/// <param name="Cells">Number of cells; 0 for a withdrawn day.</param>
/// <param name="Bands">Bands with at least one cell.</param>
/// <param name="IsWithdrawn">Whether the day was sent and then withdrawn.</param>
public readonly record struct CoverageDay(int HoursMask, int Cells, int Bands, bool IsWithdrawn);
