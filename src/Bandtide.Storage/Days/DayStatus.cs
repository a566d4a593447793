namespace Bandtide.Storage.Days;

/// <summary>What storing a day did.</summary>
public enum DayStatus
{
    /// <summary>The date had no current sheet.</summary>
    Created,

    /// <summary>A different sheet was current; it stays readable as an earlier revision.</summary>
    Replaced,

    /// <summary>The same cells are current already; nothing was stored.</summary>
    Unchanged,

    /// <summary>The day was withdrawn earlier and stays so (bulk uploads only).</summary>
    Withdrawn,
}
