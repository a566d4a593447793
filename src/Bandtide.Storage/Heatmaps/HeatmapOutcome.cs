namespace Bandtide.Storage.Heatmaps;

/// <summary>What asking for a heatmap gives.</summary>
public abstract record HeatmapOutcome
{
    private HeatmapOutcome()
    {
    }

    /// <summary>An answer, possibly without a cell.</summary>
    public sealed record Answered(HeatmapAnswer Answer) : HeatmapOutcome;

    /// <summary>No station or region of that code.</summary>
    public sealed record UnknownSelection(string Message) : HeatmapOutcome;

    /// <summary>The question cannot be answered: levels over stations of different units.</summary>
    public sealed record Refused(string Field, string Rule, string Message) : HeatmapOutcome;
}
