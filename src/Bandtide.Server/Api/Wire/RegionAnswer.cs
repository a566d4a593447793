namespace Bandtide.Server.Api;

/// <summary>A region.</summary>
/// <param name="Code">Its code.</param>
/// <param name="Name">Its name for people.</param>
/// <param name="Kind"><c>everything</c>, <c>itu-region</c>, <c>field</c>, <c>square</c>, <c>list</c> or <c>locators</c>.</param>
/// <param name="Locators">Fields and squares that make a station a member, where the kind is <c>locators</c>.</param>
/// <param name="Stations">Codes of its stations.</param>
public sealed record RegionAnswer(string Code, string Name, string Kind, IReadOnlyList<string>? Locators, IReadOnlyList<string> Stations);
