namespace Bandtide.Storage.Maintenance;

/// <summary>Counts and faults while a verification runs.</summary>
internal sealed class VerifyTally
{
    public int Sheets { get; set; }

    public int Revisions { get; set; }

    public int Tiles { get; set; }

    public List<StoreFault> Faults { get; } = [];
}
