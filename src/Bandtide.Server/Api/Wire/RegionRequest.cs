namespace Bandtide.Server.Api;

/// <summary>A region to draw up: stations or locators, not both.</summary>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Name">Its name for people.</param>
/// <param name="Stations">Codes of its stations.</param>
/// <param name="Locators">Maidenhead fields and squares.</param>
public sealed record RegionRequest(string? Code, string? Name, IReadOnlyList<string>? Stations = null, IReadOnlyList<string>? Locators = null);
