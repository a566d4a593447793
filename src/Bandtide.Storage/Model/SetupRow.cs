using Bandtide.Core.Stations;

namespace Bandtide.Storage.Model;

/// <summary>One setup of a station. Setups are added, never changed: of two with the same first date the later entry counts.</summary>
internal sealed class SetupRow
{
    public int StationId { get; set; }

    /// <summary>Order of entry at the station, from 1.</summary>
    public int Sequence { get; set; }

    /// <summary>Days since 1970-01-01.</summary>
    public int ValidFrom { get; set; }

    public string? Threshold { get; set; }
    public double? MarginDb { get; set; }
    public int? Averages { get; set; }

    public Detector? Detector { get; set; }

    public double? ResolutionHz { get; set; }
    public double? NoiseBandwidthHz { get; set; }
    public double? RevisitSeconds { get; set; }
    public double? AntennaFactorDb { get; set; }
    public string? Environment { get; set; }
    public string? Receiver { get; set; }
    public string? Antenna { get; set; }
    public string? Note { get; set; }
}
