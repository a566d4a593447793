using Bandtide.Core.Stations;

namespace Bandtide.Server.Demo;

/// <summary>Noise floor of a station by month, hour and band, and how much it drowns.</summary>
internal sealed class DemoFloors
{
    private const int Months = 12;
    private readonly int bandCount;
    private readonly float[][] levels;
    private readonly float[][] penalties;

    public DemoFloors(DemoStation station, IReadOnlyList<DemoBand> bands)
    {
        bandCount = bands.Count;
        levels = new float[Months][];
        penalties = new float[Months][];
        var point = new DemoControlPoint(station.Place);
        var tropical = 1 - DemoControlPoint.Smooth((float)Math.Abs(station.Place.LatitudeDegrees), 12, 38);
        var offset = LevelOffset(station);
        Span<float> cosZenith = stackalloc float[24];
        for (var month = 0; month < Months; month++)
        {
            // The tilt of the axis is all that matters here.
            var season = Math.Cos((month - 5.7) * Math.PI / 6);
            point.Fill(new(0, (float)(23.4 * season), 0, 0, 0, false, false), cosZenith);
            (levels[month], penalties[month]) = (new float[24 * bandCount], new float[24 * bandCount]);
            for (var i = 0; i < levels[month].Length; i++)
            {
                var band = bands[i % bandCount];
                var figure = DemoNoise.TotalDb(
                    station.Environment, band.Megahertz, cosZenith[i / bandCount], tropical, season * Math.Sign(station.Place.LatitudeDegrees));
                levels[month][i] = (float)(IsByField(station)
                    ? DemoNoise.FieldStrengthDb(figure, band.Megahertz, station.NoiseBandwidthHz)
                    : DemoNoise.PowerDbm(figure, station.NoiseBandwidthHz)) + offset;
                penalties[month][i] = (float)(figure - DemoNoise.ManMadeDb("rural", band.Megahertz));
            }
        }
    }

    /// <summary>Floors of a day in the station's unit, and noise above that of a rural place, dB: interpolated between the middles of months.</summary>
    /// <param name="date">The day.</param>
    /// <param name="level">Receives 24 x bands values.</param>
    /// <param name="penalty">Receives 24 x bands values.</param>
    public void Fill(DateOnly date, Span<float> level, Span<float> penalty)
    {
        var place = date.Month - 1 + (date.Day - 15) / 30.4f;
        var (from, share) = ((int)MathF.Floor(place), place - MathF.Floor(place));
        var (before, after) = ((from + Months) % Months, (from + 1 + Months) % Months);
        Mix(levels[before], levels[after], share, level);
        Mix(penalties[before], penalties[after], share, penalty);
    }

    private static void Mix(float[] before, float[] after, float share, Span<float> target)
    {
        for (var i = 0; i < target.Length; i++)
        {
            target[i] = before[i] + share * (after[i] - before[i]);
        }
    }

    // A flat antenna factor belongs to a probe of the field; without one the antenna is taken as lossless.
    private static bool IsByField(DemoStation station) => station.Unit == LevelUnit.DbMicrovoltPerMetre || station.AntennaFactorDb is not null;

    // From field strength or power to what the receiver shows. 0 dBm are 107 dB(uV) in 50 ohms.
    private static float LevelOffset(DemoStation station) => station.GainDb + station.Unit switch
    {
        LevelUnit.DbMilliwatt when station.AntennaFactorDb is { } factor => -107 - factor,
        LevelUnit.DbMicrovolt => 107,
        _ => 0,
    };
}
