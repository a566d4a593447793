using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;
using CsCheck;

namespace Bandtide.Core.Tests.Sheets;

/// <summary>Generated sheets that follow every rule.</summary>
internal static class SheetSamples
{
    public static readonly DateOnly Date = new(2026, 6, 1);
    public static readonly SheetContext Context = new(BandPlan.Standard, new DateTimeOffset(2026, 7, 1, 0, 0, 0, TimeSpan.Zero));

    private static readonly Gen<int> Decibel = Gen.Int[-30_000, 30_000];
    private static readonly Gen<int> Share = Gen.Int[0, 10_000];

    private static readonly Gen<int[]> Cell =
        from sweeps in Gen.Int[1, 1_000_000]
        from occupancy in Share
        from signal in Optional(Decibel)
        from level in Optional(Decibel)
        from p90 in Optional(Decibel)
        from floor in Optional(Decibel)
        from steady in Optional(Share)
        from coverage in Optional(Share)
        select new[] { sweeps, occupancy, signal, level, p90 == CellGrid.Missing || level == CellGrid.Missing ? p90 : Math.Max(p90, level), floor, steady, coverage };

    /// <summary>Grids of 1 to 12 bands with 1 to 60 cells.</summary>
    public static readonly Gen<CellGrid> Grid =
        from ids in Gen.Int[0, BandPlan.Standard.All.Count - 1].Select(i => BandPlan.Standard.All[i].Id).HashSet[1, 12]
        from cells in Gen.Select(Gen.Int[0, (24 * ids.Count) - 1], Cell).List[1, 60]
        select Of(ids, cells);

    public static bool Same(CellGrid a, CellGrid b) =>
        a.BandIds.SequenceEqual(b.BandIds) && Enum.GetValues<Quantity>().All(quantity => a.Plane(quantity).SequenceEqual(b.Plane(quantity)));

    /// <summary>One of some texts.</summary>
    public static Gen<string> OneOf(params string[] texts) => Gen.Int[0, texts.Length - 1].Select(n => texts[n]);

    /// <summary>A day with every cell and every value, each quantity of a different spread.</summary>
    public static CellGrid Full(IEnumerable<Band> bands, Random random)
    {
        var ids = bands.Select(band => band.Id).Order().ToArray();
        var size = CellGrid.Hours * ids.Length;
        int[] Plane(int low, int high) => [.. Enumerable.Range(0, size).Select(_ => random.Next(low, high + 1))];
        var (floor, above, further) = (Plane(-12_000, -8_000), Plane(0, 700), Plane(0, 3_000));
        var level = floor.Zip(above, (a, b) => a + b).ToArray();
        return new(ids, [Plane(717, 720), Plane(0, 10_000), Plane(-9_000, -3_000), level, [.. level.Zip(further, (a, b) => a + b)], floor, Plane(0, 1), Plane(10_000, 10_000)]);
    }

    private static Gen<int> Optional(Gen<int> gen) => Gen.Frequency((1, Gen.Const(CellGrid.Missing)), (4, gen));

    // Bands without a cell are dropped, as a reader does.
    private static CellGrid Of(IEnumerable<short> bandIds, List<(int Place, int[] Values)> cells)
    {
        var all = bandIds.Order().ToArray();
        var byPlace = cells.GroupBy(cell => cell.Place).ToDictionary(group => group.Key, group => group.First().Values);
        var used = all.Where((_, b) => byPlace.Keys.Any(place => place % all.Length == b)).ToArray();
        var planes = new int[]?[CellGrid.QuantityCount];
        for (var quantity = 0; quantity < planes.Length; quantity++)
        {
            var plane = new int[24 * used.Length];
            Array.Fill(plane, CellGrid.Missing);
            foreach (var (place, values) in byPlace)
            {
                plane[(place / all.Length * used.Length) + Array.IndexOf(used, all[place % all.Length])] = values[quantity];
            }

            planes[quantity] = plane.Any(value => value != CellGrid.Missing) ? plane : null;
        }

        return new(used, planes);
    }
}
