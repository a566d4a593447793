namespace Bandtide.Storage.Maintenance;

/// <summary>What a verification looked at and found.</summary>
/// <param name="Stations">Stations looked at.</param>
/// <param name="Sheets">Current sheets unpacked and compared.</param>
/// <param name="Revisions">Superseded revisions unpacked and compared.</param>
/// <param name="Tiles">Month tiles compared with a recomputation.</param>
/// <param name="Faults">Everything that is wrong; empty when the store is sound.</param>
public sealed record VerifyReport(int Stations, int Sheets, int Revisions, int Tiles, IReadOnlyList<StoreFault> Faults)
{
    /// <summary>Whether nothing is wrong.</summary>
    public bool IsSound => Faults.Count == 0;
}
