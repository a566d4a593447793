namespace Bandtide.Storage.Tiles;

/// <summary>All tiles that some months of a station have.</summary>
/// <param name="Months">12 x year + month - 1, ascending.</param>
/// <param name="Tiles">The tiles; what these months have beside is to go.</param>
internal sealed record MonthTiles(IReadOnlyList<int> Months, IReadOnlyList<PackedTile> Tiles)
{
    /// <summary>Month and measure as one number, so that a list of tiles is one parameter: <c>month * 100 + measure</c>.</summary>
    public IReadOnlyCollection<int> Keys => [.. Tiles.Select(tile => tile.Month * 100 + (int)tile.Measure)];
}
