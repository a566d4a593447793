namespace Bandtide.Server.Components.Hours;

/// <summary>How the Hours page shows its answer.</summary>
public enum HoursView
{
    /// <summary>One heatmap.</summary>
    Picture,

    /// <summary>The same numbers as a table.</summary>
    Table,

    /// <summary>The twelve months of a year.</summary>
    Year,
}
