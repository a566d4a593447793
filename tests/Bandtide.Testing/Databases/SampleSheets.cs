using Bandtide.Core.Bands;
using Bandtide.Core.Sheets;

namespace Bandtide.Testing.Databases;

/// <summary>Day sheets of chance, for tests and benchmarks of the store: valid, all different, the same for the same seed.</summary>
public static class SampleSheets
{
    /// <summary>A sheet.</summary>
    /// <param name="seed">Chooses the values.</param>
    /// <param name="bands">Number of bands, from the lowest of the service layer on; further ones from the slices.</param>
    /// <param name="presence">Share of cells that exist, above 0 to 1; at least one does.</param>
    /// <param name="signal">Whether cells carry a signal (and so an excess).</param>
    public static CellGrid Make(int seed, int bands = 4, double presence = 1, bool signal = true)
    {
        var random = new Random(seed);
        short[] ids = [.. BandPlan.Standard.All.Take(bands).Select(band => band.Id).Order()];
        var planes = new int[CellGrid.QuantityCount][];
        for (var quantity = 0; quantity < planes.Length; quantity++)
        {
            planes[quantity] = new int[ids.Length * CellGrid.Hours];
            Array.Fill(planes[quantity], CellGrid.Missing);
        }

        for (var cell = 0; cell < ids.Length * CellGrid.Hours; cell++)
        {
            // Every band keeps at least one cell, as in every sheet a reader makes.
            if (cell >= ids.Length && random.NextDouble() >= presence)
            {
                continue;
            }

            // A smooth day with noise: a floor about -105, busier where the sun is up.
            var hour = cell / ids.Length;
            var floor = -10_500 + (int)(300 * Math.Sin(hour / 24.0 * 2 * Math.PI)) + random.Next(-30, 31);
            var occupancy = Math.Clamp((int)(3_000 + 3_000 * Math.Sin((hour - 4) / 24.0 * 2 * Math.PI)) + random.Next(-300, 301), 0, 10_000);
            var level = floor + 100 + occupancy / 40 + random.Next(0, 41);
            planes[(int)Quantity.Sweeps][cell] = random.Next(20) == 0 ? random.Next(300, 720) : 720;
            planes[(int)Quantity.Occupancy][cell] = occupancy;
            planes[(int)Quantity.Level][cell] = level;
            planes[(int)Quantity.LevelP90][cell] = level + occupancy / 10 + random.Next(0, 101);
            planes[(int)Quantity.Floor][cell] = floor;
            if (signal && occupancy > 0)
            {
                planes[(int)Quantity.Signal][cell] = level + 500 + random.Next(0, 201);
            }
        }

        return new(ids, [.. planes.Select(plane => plane.All(value => value == CellGrid.Missing) ? null : plane)]);
    }
}
