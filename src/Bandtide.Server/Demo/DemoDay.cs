namespace Bandtide.Server.Demo;

/// <summary>What one UTC day brings to every station alike.</summary>
/// <param name="Activity">Solar activity, in the manner of a sunspot number.</param>
/// <param name="DeclinationDegrees">Latitude under the Sun at noon UTC.</param>
/// <param name="SubsolarLongitudeDegrees">Longitude under the Sun at noon UTC: the equation of time.</param>
/// <param name="LayerAnomaly">How strong the F layer is against the usual, normal with standard deviation 1.</param>
/// <param name="TrafficAnomaly">How much is being transmitted against the usual, normal with standard deviation 1.</param>
/// <param name="IsWeekend">Saturday or Sunday, UTC.</param>
/// <param name="IsSummerSeason">Which of the two broadcasting seasons of the year.</param>
internal sealed record DemoDay(
    float Activity, float DeclinationDegrees, float SubsolarLongitudeDegrees, float LayerAnomaly, float TrafficAnomaly, bool IsWeekend, bool IsSummerSeason);
