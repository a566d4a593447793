namespace Bandtide.Storage.Maintenance;

/// <summary>What a backup gives.</summary>
public abstract record BackupOutcome
{
    private BackupOutcome()
    {
    }

    /// <summary>The copy stands under the name asked for, was opened and found whole.</summary>
    public sealed record Done(string File, long Bytes) : BackupOutcome;

    /// <summary>Nothing was copied.</summary>
    public sealed record Refused(string Reason) : BackupOutcome;
}
