using Bandtide.Core.Bands;
using Bandtide.Core.Geography;
using Bandtide.Core.Heatmaps;
using Bandtide.Core.Stations;
using Bandtide.Core.Time;
using Bandtide.Storage.Heatmaps;

namespace Bandtide.Server.Tests.Figures;

/// <summary>Answers made by hand, with every state a cell can have.</summary>
internal static class FigureSamples
{
    public static readonly Station Helsinki = new(1, "fi-hel", "Helsinki Harbour", new(60.2, 24.9), LevelUnit.DbMilliwatt, 1, []);
    public static readonly Station Hobart = new(2, "au-hob", "Hobart", new(-42.9, 147.3), LevelUnit.DbMilliwatt, 3, []);

    public static HeatmapQuery StationMonth { get; } =
        new("fi-hel", null, new Period.Months(new(2026, 6), new(2026, 6)));

    public static HeatmapQuery RegionMonth { get; } =
        new(null, "all", new Period.Months(new(2026, 6), new(2026, 6)));

    /// <summary>An answer over all service bands whose cells a function gives.</summary>
    public static HeatmapAnswer Answer(HeatmapQuery query, Func<int, int, HeatmapCell> cell, string unit = "1", params Station[] stations)
    {
        var bands = BandPlan.Standard.Layer(BandLayer.Service);
        var cells = Enumerable.Range(0, bands.Count * 24).Select(i => cell(i / 24, i % 24)).ToArray();
        stations = stations.Length == 0 ? [Helsinki] : stations;
        return new(query, new Heatmap(bands, cells), unit, stations, 30, "r1", null, null);
    }

    /// <summary>A day's rise and fall over the bands, with an hour nobody observed, an empty hour and a thin one.</summary>
    public static HeatmapCell Plausible(int band, int hour)
    {
        if (hour == 3 || (band > 28 && hour is > 8 and < 11))
        {
            return new(double.NaN, double.NaN, double.NaN, 0, 0);
        }

        var day = 0.5 - 0.5 * Math.Cos((hour - 1) * Math.PI / 12);
        var height = band / 32.0;
        var value = hour == 4 ? 0 : Math.Clamp(0.85 * Math.Exp(-6 * Math.Pow(height - 0.15 - 0.6 * day, 2)), 0, 1);
        return new(value, Math.Max(0, value - 0.05), Math.Min(1, value + 0.05), 1, hour == 5 ? 2 : 30);
    }
}
