using System.Globalization;
using System.Net.Http.Json;
using System.Text;
using Bandtide.Core.Bands;
using Bandtide.Server.Tests.Hosting;

namespace Bandtide.Browser.Tests.Site;

/// <summary>A small invented network, the same in every run: five stations, two months, and what real ones have of blemishes.</summary>
internal static class SampleNetwork
{
    /// <summary>A station with all bands and every day, and its latitude and longitude, which no page may tell.</summary>
    public const string Lighthouse = "lighthouse";

    /// <summary>Exact position of <see cref="Lighthouse"/>.</summary>
    public static readonly (double Latitude, double Longitude) LighthousePosition = (54.1837, 7.8913);

    /// <summary>A station with one band on one day.</summary>
    public const string Mast = "mast";

    /// <summary>A station in the south with gaps, a short day and a withdrawn one.</summary>
    public const string Orchard = "orchard";

    /// <summary>The withdrawn day.</summary>
    public const string WithdrawnDay = "2026-06-12";

    private static readonly (string Code, string Name, double Latitude, double Longitude)[] Stations =
    [
        (Lighthouse, "Lighthouse", LighthousePosition.Latitude, LighthousePosition.Longitude),
        ("granary", "Granary", 47.3, 19.2),
        (Orchard, "Orchard", -34.6, 138.7),
        ("quarry", "Quarry", 44.8, -72.6),
        (Mast, "Mast", 35.6, 139.6),
    ];

    /// <summary>Registers the stations, sends their days and returns the keys by station.</summary>
    public static async Task<IReadOnlyDictionary<string, string>> FillAsync(ServerHost host)
    {
        var keys = new Dictionary<string, string>(StringComparer.Ordinal);
        foreach (var (code, name, latitude, longitude) in Stations)
        {
            keys[code] = await RegisterAsync(host, code, name, latitude, longitude);
            await host.Coordinator.PostAsJsonAsync($"stations/{code}/setups", new
            {
                validFrom = "2026-01-01", threshold = "floor+margin", marginDb = 6, detector = "power", resolutionHz = 1000, revisitSeconds = 5,
                environment = "rural", receiver = "Direct-sampling receiver, 14 bit", antenna = "Active loop, 1 m",
            });
            await host.Coordinator.PostDaysAsync(code, Days(code, latitude, longitude));
        }

        await host.Coordinator.DeleteAsync(new Uri($"stations/{Orchard}/days/{WithdrawnDay}", UriKind.Relative));
        await host.Coordinator.PostAsJsonAsync("regions", new { code = "club", name = "Club stations", stations = new[] { Lighthouse, "granary", "quarry" } });
        return keys;
    }

    private static async Task<string> RegisterAsync(ServerHost host, string code, string name, double latitude, double longitude)
    {
        using var response = await host.Coordinator.PostAsJsonAsync("stations", new { code, name, latitude, longitude, levelUnit = "dBm" });
        response.EnsureSuccessStatusCode();
        return (await response.JsonAsync())["key"]!.GetValue<string>();
    }

    private static string Days(string code, double latitude, double longitude)
    {
        var text = new StringBuilder("date,hour,band,sweeps,occupancy,signal,level,level_p90,floor\n");
        var random = new Random(code.Length * 97 + code[0]);
        if (code is Mast)
        {
            return text.Append("2026-06-20,8,std-10000,720,0.5,-70,-80,-60,-95\n2026-06-20,9,std-10000,720,0,,-95,-90,-95\n").ToString();
        }

        for (var date = new DateOnly(2026, 5, 1); date <= new DateOnly(2026, 6, 28); date = date.AddDays(1))
        {
            if (code is not Lighthouse && random.NextDouble() < 0.08)
            {
                continue;
            }

            AddDay(text, date, code is Orchard && date.Day == 3 ? 9 : 24, latitude, longitude, random);
        }

        return text.ToString();
    }

    private static void AddDay(StringBuilder text, DateOnly date, int hours, double latitude, double longitude, Random random)
    {
        var declination = 23.4 * Math.Sin((date.DayOfYear - 81) * Math.Tau / 365);
        for (var hour = 0; hour < hours; hour++)
        {
            var sun = Math.Sin(Radians(latitude)) * Math.Sin(Radians(declination))
                + Math.Cos(Radians(latitude)) * Math.Cos(Radians(declination)) * Math.Cos(Radians((hour + longitude / 15 - 12) * 15));
            var highest = 9 + 14 * Math.Pow(Math.Max(0, sun + 0.25), 0.6) + random.NextDouble();
            foreach (var band in BandPlan.Standard.Layer(BandLayer.Service))
            {
                var megahertz = band.LowHz / 1e6;
                var open = 1 / (1 + Math.Exp((megahertz - highest) / 1.3)) * Math.Exp(-Math.Max(0, sun) * 60 / Math.Pow(megahertz, 1.5));
                var busy = band.Code[0] switch { 'b' => 0.75, 'a' => 0.35, _ => 0.9 };
                var occupancy = Math.Round(busy * open * (0.85 + 0.2 * random.NextDouble()), 4);
                var floor = -104 - 8 * Math.Log10(Math.Max(0.2, megahertz));
                var signal = occupancy == 0 ? "" : (floor + 12 + 20 * occupancy).ToString("0.00", CultureInfo.InvariantCulture);
                text.Append(CultureInfo.InvariantCulture, $"{date:yyyy-MM-dd},{hour},{band.Code},720,{occupancy:0.0000},{signal},{floor + 5 * occupancy:0.00},{floor + 4 + 20 * occupancy:0.00},{floor:0.00}\n");
            }
        }
    }

    private static double Radians(double degrees) => degrees * Math.PI / 180;
}
