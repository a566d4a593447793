using Bandtide.Core.Geography;

namespace Bandtide.Core.Stations;

/// <summary>One receiver at one place, as the core needs it.</summary>
/// <param name="Id">The store's identity of the station.</param>
/// <param name="Code">2 to 24 of <c>a-z 0-9 -</c>.</param>
/// <param name="Name">The name people use.</param>
/// <param name="Position">Exact position: never published, see <see cref="Square"/>.</param>
/// <param name="Unit">Unit of its decibel values.</param>
/// <param name="ItuRegion">1 to 3, as its operator declared or as guessed from the position.</param>
/// <param name="Setups">By ascending first date.</param>
public sealed record Station(
    int Id, string Code, string Name, GeoPoint Position, LevelUnit Unit, int ItuRegion, IReadOnlyList<Setup> Setups)
{
    /// <summary>The four-character Maidenhead square: the only position that is published.</summary>
    public MaidenheadLocator Square { get; } = MaidenheadLocator.FromPoint(Position, 4);

    /// <summary>The setup in effect on a date, or <c>null</c> before the first.</summary>
    public Setup? SetupOn(DateOnly date) => Setups.LastOrDefault(setup => setup.ValidFrom <= date);
}
