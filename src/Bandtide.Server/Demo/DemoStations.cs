using Bandtide.Core.Stations;

namespace Bandtide.Server.Demo;

/// <summary>The sixteen stations of an invented listener club. Names and places mean nobody.</summary>
internal static class DemoStations
{
    /// <summary>All stations, the one whose key is given away first.</summary>
    public static IReadOnlyList<DemoStation> All { get; } =
    [
        new()
        {
            Code = "alder-mill", Name = "Alder Mill", Place = new(52.41, -1.32), Unit = LevelUnit.DbMilliwatt, Environment = "residential",
            AntennaFactorDb = 12, LowestMegahertz = 0.1f, HasSlices = true, RevisitSeconds = 5, SensitivityDb = 2,
            Setups =
            [
                Told("residential", 5, 500, 12, "Direct-sampling receiver, 16 bit", "Active vertical, 1.5 m"),
                Told("residential", 5, 500, 3, "Direct-sampling receiver, 16 bit", "Active vertical, 1.5 m, with preamplifier", "Preamplifier added: 9 dB", new(2024, 9, 14)),
            ],
            Faults = new() { GainSteps = [(new(2024, 9, 14), 9)] },
        },
        new()
        {
            Code = "birch-lodge", Name = "Birch Lodge", Place = new(61.35, 24.22), Unit = LevelUnit.DbMicrovoltPerMetre, Environment = "rural",
            LowestMegahertz = 0.1f, SensitivityDb = 3,
            Setups = [Told("rural", 10, 500, 14, "Measuring receiver with sweep log", "Calibrated active rod, ground plate")],
        },
        new()
        {
            Code = "larkfield", Name = "Larkfield", Place = new(48.31, 11.42), Unit = LevelUnit.DbFullScale, Environment = "city", GainDb = 21,
            SensitivityDb = -2, LowestMegahertz = 0.1f,
            Setups = [Told("city", 10, 500, null, "Dongle with upconverter", "Wire along the balcony, 6 m")],
            Faults = new() { Carriers = [("ama-30m", new(2025, 6, 20), .14f)], Noise = (new(2024, 1, 8), new(2024, 2, 25), 11) },
        },
        new()
        {
            Code = "larkfield-hill", Name = "Larkfield Hill", Place = new(48.62, 11.05), Unit = LevelUnit.DbFullScale, Environment = "rural", GainDb = 28,
            SensitivityDb = 3, LowestMegahertz = 0.1f,
            Setups = [Told("rural", 10, 500, null, "Dongle with upconverter", "Loop, 1 m, on a fence post")],
        },
        new()
        {
            Code = "cork-oak", Name = "Cork Oak", Place = new(38.52, -8.35), Unit = LevelUnit.DbMilliwatt, Environment = "rural", GainDb = -4,
            SensitivityDb = 1, PartlySeen = new Dictionary<string, float>(StringComparer.Ordinal) { ["ama-10m"] = .59f },
            Setups = [Told("rural", 10, 500, null, "Direct-sampling receiver, 14 bit", "Sloping wire, 20 m", "Watches up to 29 MHz")],
        },
        new()
        {
            Code = "fjord-cabin", Name = "Fjord Cabin", Place = new(69.21, 18.64), Unit = LevelUnit.DbMilliwatt, Environment = "quiet-rural", AntennaFactorDb = 9,
            SensitivityDb = 5, FirstDate = new(2024, 2, 10),
            Setups = [Told("quiet-rural", 10, 500, 9, "Direct-sampling receiver, 16 bit", "Active vertical, 1 m", null, new(2024, 2, 10))],
            Faults = new() { FailuresPerYear = 4 },
        },
        new()
        {
            Code = "cedar-bend", Name = "Cedar Bend", Place = new(41.37, -77.42), Unit = LevelUnit.DbMilliwatt, Environment = "rural", AntennaFactorDb = 10,
            SensitivityDb = 2, LowestMegahertz = 0.5f, HasSlices = true, RevisitSeconds = 5,
            Setups = [Told("rural", 5, 500, 10, "Direct-sampling receiver, 16 bit", "Active dipole at 4 m")],
            Faults = new() { WrongClock = (new(2024, 3, 11), new(2024, 5, 2), 4) },
        },
        new()
        {
            Code = "prairie-barn", Name = "Prairie Barn", Place = new(44.12, -98.64), Unit = LevelUnit.DbFullScale, Environment = "rural", GainDb = 24,
            LowestMegahertz = 0.5f, RevisitSeconds = 30,
            Setups = [Told("rural", 30, 500, null, "Dongle with upconverter", "Barbed-wire fence, 80 m")],
            Faults = new()
            {
                Copies = new Dictionary<DateOnly, DateOnly>
                {
                    [new(2024, 11, 5)] = new(2024, 11, 2), [new(2025, 7, 18)] = new(2025, 7, 17), [new(2025, 7, 19)] = new(2025, 7, 17),
                },
            },
        },
        new()
        {
            Code = "pampa-gate", Name = "Pampa Gate", Place = new(-34.86, -60.31), Unit = LevelUnit.DbFullScale, Environment = "rural", GainDb = 19,
            SensitivityDb = 1, LowestMegahertz = 0.5f,
            Setups = [Told("rural", 10, 500, null, "Direct-sampling receiver, 12 bit", "Inverted V at 7 m")],
            Faults = new() { GainSteps = [(new(2025, 3, 3), -6)] },
        },
        new()
        {
            Code = "mango-court", Name = "Mango Court", Place = new(-8.21, -35.62), Unit = LevelUnit.DbFullScale, Environment = "residential", GainDb = 30,
            SensitivityDb = -1, RevisitSeconds = 30, ReportsSteady = false,
            Setups = [Told("residential", 30, 500, null, "Dongle, direct sampling", "Wire on the roof, 9 m", null, new(2024, 1, 20))],
            Faults = new() { FailuresPerYear = 5 },
        },
        new()
        {
            Code = "acacia-ridge", Name = "Acacia Ridge", Place = new(-1.38, 36.55), Unit = LevelUnit.DbFullScale, Environment = "residential", GainDb = 26,
            SensitivityDb = 1, ReportsSteady = false,
            Setups = [Told("residential", 10, 500, null, "Direct-sampling receiver, 12 bit", "Active loop, 1 m")],
            Faults = new() { PowerCuts = (15, 17, .22f), FailuresPerYear = 5, BrokenDayShare = .08f },
        },
        new()
        {
            Code = "karoo-well", Name = "Karoo Well", Place = new(-32.24, 22.61), Unit = LevelUnit.DbMilliwatt, Environment = "quiet-rural", GainDb = -2,
            SensitivityDb = 4, LastDate = new(2025, 11, 9),
            Setups = [Told("quiet-rural", 10, 500, null, "Direct-sampling receiver, 14 bit", "Vertical, 5 m, on solar power")],
        },
        new()
        {
            Code = "rice-terrace", Name = "Rice Terrace", Place = new(36.12, 138.37), Unit = LevelUnit.DbMilliwatt, Environment = "residential", GainDb = -3,
            LowestMegahertz = 0.5f, HasSlices = true, SensitivityDb = 1,
            Setups = [Told("residential", 10, 500, null, "Direct-sampling receiver, 16 bit", "Loop, 2 m, in the attic")],
        },
        new()
        {
            Code = "monsoon-house", Name = "Monsoon House", Place = new(18.62, 74.15), Unit = LevelUnit.DbFullScale, Environment = "city", GainDb = 23,
            SensitivityDb = -1, RevisitSeconds = 60, FirstDate = new(2025, 4, 1), ReportsSteady = false,
            Faults = new() { FailuresPerYear = 6, BrokenDayShare = .05f },
        },
        new()
        {
            Code = "gumtree-flat", Name = "Gumtree Flat", Place = new(-36.41, 145.18), Unit = LevelUnit.DbMicrovolt, Environment = "rural", GainDb = -1,
            SensitivityDb = 3, LowestMegahertz = 0.5f,
            Setups = [Told("rural", 10, 500, null, "Direct-sampling receiver, 16 bit", "Terminated loop, 12 m")],
        },
        new()
        {
            Code = "tussock-hut", Name = "Tussock Hut", Place = new(-44.08, 170.52), Unit = LevelUnit.DbMilliwatt, Environment = "rural", GainDb = -5,
            SensitivityDb = 2, FirstDate = new(2023, 8, 19), MarginDb = 6,
            Setups = [Told("rural", 10, 250, null, "Direct-sampling receiver, 14 bit", "Vertical, 6 m, salt-water side", null, new(2023, 8, 19)) with { MarginDb = 6 }],
            ResolutionHz = 250,
        },
    ];

    private static Setup Told(
        string environment, int revisitSeconds, double resolutionHz, double? antennaFactorDb, string receiver, string antenna, string? note = null, DateOnly? from = null) =>
        new(
            from ?? DemoScenario.FirstDate, "floor+margin", 5, 64, Detector.Power, resolutionHz, 1.5 * resolutionHz, revisitSeconds, antennaFactorDb,
            environment, receiver, antenna, note);
}
