using System.Runtime.CompilerServices;
using Bandtide.Core.Sheets;

namespace Bandtide.Server.Demo;

/// <summary>
/// Makes the day sheets of one station: each from its date alone, so that a day is the same whenever it is made.
/// Not for several threads at once.
/// </summary>
internal sealed class DemoSheets
{
    // Weight at which a band is half as full as it can be.
    private const float HalfFull = 0.30f;
    private const float FalseShare = 0.004f;
    private static readonly float[] CellFactor = [.. Enumerable.Range(0, 1024).Select(i => MathF.Exp(0.20f * DemoRandom.NormalOf((ulong)i)))];

    private readonly DemoStation station;
    private readonly DemoWeather weather;
    private readonly DemoBand[] bands;
    private readonly short[] bandIds;
    private readonly DemoFloors floors;
    private readonly DemoOpenings openings;
    private readonly DemoTimes times;
    private readonly ulong layerPurpose;
    private readonly ulong trafficPurpose;
    private readonly ulong floorPurpose;
    private readonly ulong cellPurpose;
    private readonly float[] floor;
    private readonly float[] noise;
    private readonly float[] open;
    private readonly float[] excess;

    /// <summary>Prepares a station.</summary>
    /// <param name="station">The station.</param>
    /// <param name="weather">Covers all days that will be asked for.</param>
    public DemoSheets(DemoStation station, DemoWeather weather)
    {
        (this.station, this.weather) = (station, weather);
        bands = [.. DemoBand.All.Where(band => band.Use == DemoUse.Mixture ? station.HasSlices : band.Megahertz >= station.LowestMegahertz)];
        bandIds = [.. bands.Select(band => band.Id)];
        floors = new(station, bands);
        openings = new(station, bands, weather);
        times = new(station);
        layerPurpose = DemoRandom.Purpose(station.Code + "/layer");
        trafficPurpose = DemoRandom.Purpose(station.Code + "/traffic");
        floorPurpose = DemoRandom.Purpose(station.Code + "/floor");
        cellPurpose = DemoRandom.Purpose(station.Code + "/cell");
        (floor, noise, open, excess) = (Row(), Row(), Row(), Row());
    }

    /// <summary>The sheet of a date, or <c>null</c> where the station sent none.</summary>
    public DaySheet? Make(DateOnly date)
    {
        var original = station.Faults.Copies.GetValueOrDefault(date, date);
        var hours = times.HoursOn(original);
        return hours == 0 ? null : new(date, Cells(original, hours));
    }

    private float[] Row() => new float[24 * bands.Length];

    private CellGrid Cells(DateOnly date, int hours)
    {
        var day = DemoWeather.DayOf(date);
        var on = weather.On(day);
        floors.Fill(date, floor, noise);
        var drift = DemoRandom.Anomaly(floorPurpose, day);
        if (station.Faults.Noise is { } noisy && date >= noisy.First && date <= noisy.Last)
        {
            drift += noisy.Db;
        }

        for (var i = 0; i < noise.Length; i++)
        {
            floor[i] += drift;
            noise[i] += drift;
        }

        // The layer varies from day to day by some 7 %, more of it alike everywhere than not.
        openings.Fill(day, 1 + 0.055f * on.LayerAnomaly + 0.035f * DemoRandom.Anomaly(layerPurpose, day), noise, open, excess);
        var traffic = MathF.Exp(0.10f * on.TrafficAnomaly + 0.12f * DemoRandom.Anomaly(trafficPurpose, day));
        var planes = NewPlanes();
        var random = DemoRandom.Of(cellPurpose, day);
        for (var hour = 0; hour < 24; hour++)
        {
            if ((hours & (1 << hour)) != 0)
            {
                var sweeps = Sweeps(random.Next());
                WriteHour(planes, hour, TrueHour(date, hour), sweeps, traffic, on.IsSummerSeason, ref random);
            }
        }

        AddFaults(planes, date);
        return new(bandIds, planes);
    }

    private int[][] NewPlanes()
    {
        var planes = new int[CellGrid.QuantityCount][];
        for (var quantity = 0; quantity < planes.Length; quantity++)
        {
            if ((Quantity)quantity == Quantity.Steady ? station.ReportsSteady : (Quantity)quantity != Quantity.Coverage || station.PartlySeen.Count > 0)
            {
                planes[quantity] = new int[floor.Length];
                planes[quantity].AsSpan().Fill(CellGrid.Missing);
            }
        }

        return planes;
    }

    // Within one day: the clock's error is taken around the day, which its neighbours resemble.
    private int TrueHour(DateOnly date, int hour) =>
        station.Faults.WrongClock is { } clock && date >= clock.First && date <= clock.Last ? (hour + clock.HoursBehind) % 24 : hour;

    // Now and then a program starts anew in the middle of an hour.
    private int Sweeps(ulong bits) =>
        (bits & 63) != 0 ? station.SweepsPerHour : Math.Max(1, (int)(station.SweepsPerHour * ((int)(bits >> 6) & 1023) / 1024));

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void WriteHour(int[][] planes, int hour, int trueHour, int sweeps, float traffic, bool isSummerSeason, ref DemoRandom random)
    {
        var (row, source) = (hour * bands.Length, trueHour * bands.Length);
        for (var b = 0; b < bands.Length; b++)
        {
            var (band, bits) = (bands[b], random.Next());
            var heard = open[source + b];
            var full = band.Density * (isSummerSeason ? band.SummerFactor : 2 - band.SummerFactor) * heard / (heard + HalfFull) + band.Local;
            full = Math.Min(full, 0.985f);
            var factor = traffic * CellFactor[bits & 1023];
            var share = full * factor / (1 - full + full * factor);
            var occupancy = (int)(10_000 * (share + FalseShare * factor * (1 - share)));
            var above = Math.Clamp(2.2f + 0.26f * (heard > 1e-4f ? excess[source + b] / heard : 0) + 0.5f * DemoRandom.NormalOf(bits >> 10), 0.8f, 30f);
            var level = floor[source + b] + 0.25f * DemoRandom.NormalOf(bits >> 20);
            var cell = row + b;
            planes[(int)Quantity.Sweeps][cell] = sweeps;
            planes[(int)Quantity.Occupancy][cell] = occupancy;
            planes[(int)Quantity.Floor][cell] = Hundredths(level);
            var median = Hundredths(level + DemoLevels.MedianDb(occupancy / 10_000f, station.MarginDb, above));
            planes[(int)Quantity.Level][cell] = median;
            planes[(int)Quantity.LevelP90][cell] =
                Math.Max(median, Hundredths(level + DemoLevels.UpperDb(occupancy / 10_000f, station.MarginDb, above)));
            planes[(int)Quantity.Signal][cell] = occupancy == 0 ? CellGrid.Missing : Math.Max(median, Hundredths(level + station.MarginDb + above));
            if (planes[(int)Quantity.Steady] is { } steady)
            {
                steady[cell] = (bits >> 60) == 0 ? (int)((bits >> 30) & 127) : 0;
            }
        }
    }

    private void AddFaults(int[][] planes, DateOnly date)
    {
        foreach (var (from, db) in station.Faults.GainSteps)
        {
            if (date >= from)
            {
                Raise(planes, Hundredths(db));
            }
        }

        foreach (var (code, from, share) in station.Faults.Carriers)
        {
            if (date >= from)
            {
                AddCarrier(planes, Array.FindIndex(bands, band => string.Equals(band.Code, code, StringComparison.Ordinal)), (int)(10_000 * share));
            }
        }

        foreach (var (code, share) in station.PartlySeen)
        {
            var band = Array.FindIndex(bands, band => string.Equals(band.Code, code, StringComparison.Ordinal));
            for (var b = 0; b < bands.Length; b++)
            {
                Cover(planes, b, b == band ? (int)(10_000 * share) : 10_000);
            }
        }
    }

    private static void Raise(int[][] planes, int hundredths)
    {
        foreach (var quantity in (ReadOnlySpan<Quantity>)[Quantity.Floor, Quantity.Level, Quantity.LevelP90, Quantity.Signal])
        {
            foreach (ref var value in planes[(int)quantity].AsSpan())
            {
                value += value == CellGrid.Missing ? 0 : hundredths;
            }
        }
    }

    private void AddCarrier(int[][] planes, int band, int share)
    {
        for (var i = band; i < floor.Length; i += bands.Length)
        {
            if (planes[(int)Quantity.Sweeps][i] != CellGrid.Missing)
            {
                var occupancy = planes[(int)Quantity.Occupancy];
                occupancy[i] = share + (int)((long)occupancy[i] * (10_000 - share) / 10_000);
                planes[(int)Quantity.Steady][i] = share;
            }
        }
    }

    private void Cover(int[][] planes, int band, int share)
    {
        for (var i = band; i < floor.Length; i += bands.Length)
        {
            if (planes[(int)Quantity.Sweeps][i] != CellGrid.Missing)
            {
                planes[(int)Quantity.Coverage][i] = share;
            }
        }
    }

    private static int Hundredths(float decibels) => (int)MathF.Round(decibels * 100);
}
