using System.Globalization;
using Bandtide.Core.Stations;

namespace Bandtide.Core.Heatmaps;

/// <summary>Judges whether a measure of several stations can be pooled and compared.</summary>
public static class LevelComparability
{
    /// <summary>Largest ratio of two resolutions.</summary>
    public const double MaxResolutionRatio = 2;

    /// <summary>Largest difference of two margins, dB.</summary>
    public const double MaxMarginDifferenceDb = 3;

    /// <summary>Judges the stations of a selection.</summary>
    /// <param name="measure">The measure asked for.</param>
    /// <param name="stations">Stations with data in the selection.</param>
    /// <param name="from">First date of the selection.</param>
    /// <param name="to">Last date of the selection.</param>
    /// <remarks>
    /// Levels of different units are refused. Uncalibrated levels (dBFS) of several stations, and setups that differ in detector,
    /// in resolution by more than a factor of 2 or in margin by more than 3 dB, are answered with a caution: occupancy itself depends
    /// on resolution and margin (ITU-R SM.2256). What a station has not told is not held against it.
    /// </remarks>
    public static Comparability Judge(Measure measure, IReadOnlyCollection<Station> stations, DateOnly from, DateOnly to)
    {
        ArgumentNullException.ThrowIfNull(stations);
        var isLevel = measure.Info().IsGainDependent;
        if (isLevel && stations.Select(station => station.Unit).Distinct().Skip(1).Any())
        {
            var units = stations.Select(station => station.Unit.Text()).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal);
            return new($"{measure.Info().Label} cannot be pooled over stations of different units ({string.Join(", ", units)}).", null);
        }

        var reasons = new List<string>();
        if (isLevel && stations.Count > 1 && stations.Any(station => station.Unit == LevelUnit.DbFullScale))
        {
            reasons.Add("levels in dBFS are not calibrated against each other");
        }

        reasons.AddRange(SetupReasons([.. stations.SelectMany(station => InEffect(station, from, to))]));
        return new(null, reasons.Count == 0 ? null : string.Create(
            CultureInfo.InvariantCulture, $"Not comparable between stations or dates: {string.Join("; ", reasons)}."));
    }

    private static IEnumerable<Setup> InEffect(Station station, DateOnly from, DateOnly to) => station.Setups.Where((setup, i) =>
        setup.ValidFrom <= to && (i + 1 == station.Setups.Count || station.Setups[i + 1].ValidFrom > from));

    private static IEnumerable<string> SetupReasons(IReadOnlyCollection<Setup> setups)
    {
        if (setups.Select(setup => setup.Detector).Where(detector => detector is not null).Distinct().Skip(1).Any())
        {
            yield return "setups differ in detector";
        }

        var resolutions = setups.Select(setup => setup.ResolutionHz).OfType<double>().ToList();
        if (resolutions.Count > 0 && resolutions.Max() > MaxResolutionRatio * resolutions.Min())
        {
            yield return "setups differ in resolution by more than a factor of 2";
        }

        var margins = setups.Select(setup => setup.MarginDb).OfType<double>().ToList();
        if (margins.Count > 0 && margins.Max() - margins.Min() > MaxMarginDifferenceDb)
        {
            yield return "setups differ in margin by more than 3 dB";
        }
    }
}
