using Bandtide.Core.Stations;

namespace Bandtide.Storage.Network;

/// <summary>A named set of stations.</summary>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Name">The name people use.</param>
/// <param name="Kind">What makes a station a member.</param>
/// <param name="Locators">Fields or squares whose stations are members, for <see cref="RegionKind.Locators"/>.</param>
/// <param name="Stations">The members now, by ascending code.</param>
public sealed record Region(string Code, string Name, RegionKind Kind, IReadOnlyList<string> Locators, IReadOnlyList<Station> Stations);
