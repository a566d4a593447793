namespace Bandtide.Core.Sun;

/// <summary>When the Sun passes an elevation during the 24 hours of a local mean day.</summary>
/// <param name="Status">Which of the passages exist.</param>
/// <param name="Rising">First upward passage, or <c>null</c>.</param>
/// <param name="Setting">First downward passage, or <c>null</c>; earlier than the rising one where the day begins in light.</param>
public readonly record struct SunCrossing(SunDayStatus Status, DateTimeOffset? Rising, DateTimeOffset? Setting);
