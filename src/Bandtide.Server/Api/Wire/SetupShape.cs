using Bandtide.Core.Stations;
using Bandtide.Core.Time;

namespace Bandtide.Server.Api;

/// <summary>A setup as it travels.</summary>
/// <param name="ValidFrom">First UTC date, <c>yyyy-MM-dd</c>.</param>
/// <param name="Threshold"><c>fixed</c> or <c>floor+margin</c>.</param>
/// <param name="MarginDb">Margin of the threshold above the floor, dB.</param>
/// <param name="Averages">Spectra averaged in one sweep.</param>
/// <param name="Detector"><c>power</c>, <c>log</c> or <c>peak</c>.</param>
/// <param name="ResolutionHz">Width of a frequency bin, Hz.</param>
/// <param name="NoiseBandwidthHz">Equivalent noise bandwidth of a bin, Hz.</param>
/// <param name="RevisitSeconds">Time from one sweep to the next, s.</param>
/// <param name="AntennaFactorDb">Antenna factor, dB/m.</param>
/// <param name="Environment"><c>city</c>, <c>residential</c>, <c>rural</c> or <c>quiet-rural</c> (ITU-R P.372).</param>
/// <param name="Receiver">Free text.</param>
/// <param name="Antenna">Free text.</param>
/// <param name="Note">Free text.</param>
public sealed record SetupShape(
    string? ValidFrom, string? Threshold = null, double? MarginDb = null, int? Averages = null, string? Detector = null, double? ResolutionHz = null,
    double? NoiseBandwidthHz = null, double? RevisitSeconds = null, double? AntennaFactorDb = null, string? Environment = null, string? Receiver = null,
    string? Antenna = null, string? Note = null)
{
    internal static IReadOnlyList<string> Thresholds { get; } = ["fixed", "floor+margin"];

    internal static IReadOnlyList<string> Detectors { get; } = ["power", "log", "peak"];

    internal static IReadOnlyList<string> Environments { get; } = ["city", "residential", "rural", "quiet-rural"];

    internal static SetupShape Of(Setup setup) => new(
        DateText.Format(setup.ValidFrom), setup.Threshold, setup.MarginDb, setup.Averages,
        setup.Detector is { } detector ? Detectors[(int)detector] : null, setup.ResolutionHz, setup.NoiseBandwidthHz,
        setup.RevisitSeconds, setup.AntennaFactorDb, setup.Environment, setup.Receiver, setup.Antenna, setup.Note);

    internal Setup? Check(FieldCheck check)
    {
        var date = default(DateOnly);
        if (ValidFrom is null || !DateText.TryParse(ValidFrom, out date) || date.Year < 1950)
        {
            check.Add("validFrom", "date-syntax", "validFrom must be a date, yyyy-MM-dd, from 1950 on.");
        }

        check.OneOf("threshold", Threshold, Thresholds);
        check.Range("marginDb", MarginDb, 0, 100);
        check.Range("averages", Averages, 1, 1_000_000);
        check.OneOf("detector", Detector, Detectors);
        check.Range("resolutionHz", ResolutionHz, 0.001, 30_000_000);
        check.Range("noiseBandwidthHz", NoiseBandwidthHz, 0.001, 30_000_000);
        check.Range("revisitSeconds", RevisitSeconds, 0.001, 86_400);
        check.Range("antennaFactorDb", AntennaFactorDb, -200, 200);
        check.OneOf("environment", Environment, Environments);
        check.Text("receiver", Receiver, 200);
        check.Text("antenna", Antenna, 200);
        check.Text("note", Note, 1000);
        return check.Problem is not null ? null : new(
            date, Threshold, MarginDb, Averages, Detector is null ? null : (Core.Stations.Detector)Detectors.ToList().IndexOf(Detector), ResolutionHz,
            NoiseBandwidthHz, RevisitSeconds, AntennaFactorDb, Environment, Receiver, Antenna, Note);
    }
}
