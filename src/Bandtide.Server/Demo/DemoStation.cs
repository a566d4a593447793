using Bandtide.Core.Geography;
using Bandtide.Core.Stations;

namespace Bandtide.Server.Demo;

/// <summary>An invented station: where it is, how well it hears, what it sends, and what went wrong there.</summary>
internal sealed record DemoStation
{
    /// <summary>2 to 24 of <c>a-z 0-9 -</c>.</summary>
    public required string Code { get; init; }

    /// <summary>The name people use.</summary>
    public required string Name { get; init; }

    /// <summary>A plausible place, nobody's home.</summary>
    public required GeoPoint Place { get; init; }

    /// <summary>Unit of its levels.</summary>
    public required LevelUnit Unit { get; init; }

    /// <summary>Class of man-made noise of ITU-R P.372.</summary>
    public required string Environment { get; init; }

    /// <summary>How much better than a plain antenna in a rural place it hears, dB.</summary>
    public float SensitivityDb { get; init; }

    /// <summary>Difference between what its receiver shows and the true level, dB: its uncalibrated gain.</summary>
    public float GainDb { get; init; }

    /// <summary>Antenna factor where the antenna's is flat and known, dB/m.</summary>
    public float? AntennaFactorDb { get; init; }

    /// <summary>Width of a bin, Hz.</summary>
    public float ResolutionHz { get; init; } = 500;

    /// <summary>Margin of its threshold above the floor, dB.</summary>
    public float MarginDb { get; init; } = 5;

    /// <summary>Seconds from one sweep to the next.</summary>
    public int RevisitSeconds { get; init; } = 10;

    /// <summary>Lowest frequency that it watches, MHz.</summary>
    public float LowestMegahertz { get; init; } = 1.7f;

    /// <summary>Whether it reports the slices beside the bands of services.</summary>
    public bool HasSlices { get; init; }

    /// <summary>Whether it reports steady carriers.</summary>
    public bool ReportsSteady { get; init; } = true;

    /// <summary>Bands that it sees in part, by code, with the observed share of their width.</summary>
    public IReadOnlyDictionary<string, float> PartlySeen { get; init; } = new Dictionary<string, float>(StringComparer.Ordinal);

    /// <summary>First day with data.</summary>
    public DateOnly FirstDate { get; init; } = DemoScenario.FirstDate;

    /// <summary>Last day with data: later than this it is silent.</summary>
    public DateOnly LastDate { get; init; } = DateOnly.MaxValue;

    /// <summary>What it has told about itself; empty at a station that never did.</summary>
    public IReadOnlyList<Setup> Setups { get; init; } = [];

    /// <summary>What went wrong.</summary>
    public DemoFaults Faults { get; init; } = new();

    /// <summary>Its sweeps in a whole hour.</summary>
    public int SweepsPerHour => 3600 / RevisitSeconds;

    /// <summary>The noise bandwidth of a bin, Hz: that of a Hann window.</summary>
    /// <remarks>1.5 bins: Harris (1978), On the use of windows, Proc. IEEE 66, Table 1.</remarks>
    public float NoiseBandwidthHz => 1.5f * ResolutionHz;
}
