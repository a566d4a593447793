namespace Bandtide.Storage.Network;

/// <summary>What is needed to draw up a region: a list of stations, or of locators, never both.</summary>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Name">The name people use.</param>
/// <param name="Stations">Codes of the members, or <c>null</c> where locators are given.</param>
/// <param name="Locators">Maidenhead fields or squares in either case, or <c>null</c> where stations are given.</param>
public sealed record NewRegion(string Code, string Name, IReadOnlyList<string>? Stations, IReadOnlyList<string>? Locators);
