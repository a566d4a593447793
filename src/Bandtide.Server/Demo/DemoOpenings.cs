using System.Runtime.CompilerServices;

namespace Bandtide.Server.Demo;

/// <summary>How far each band is open at a station, hour by hour of one day: the sum over all paths of what gets through.</summary>
internal sealed class DemoOpenings
{
    // Paths that carry less than this share of the loudest are not followed.
    private const float LeastShare = 0.05f;
    private const int MufSteps = 512;
    private const float MufScale = 256;
    private const int MarginSteps = 512;
    private const float MarginScale = 4;

    // Below the highest usable frequency nearly always, above it hardly ever: about as day-to-day variation goes.
    private static readonly float[] BelowMuf = [.. Enumerable.Range(0, MufSteps + 1).Select(i => Logistic((0.90f - i / MufScale) / 0.055f))];

    // Transmitters differ by many decibels: some are heard while the typical one is not.
    private static readonly float[] AboveNoise = [.. Enumerable.Range(0, MarginSteps + 1).Select(i => Logistic((i - MarginSteps / 2) / MarginScale / 6.5f))];

    private readonly DemoWeather weather;
    private readonly DemoPath[] paths;
    private readonly float[] weights;
    private readonly int[] uses;
    private readonly float[] megahertz;
    private readonly float[] lossFactors;
    private readonly float[] strengths;
    private readonly float[] cosZenith = new float[24];
    private readonly float[] light = new float[24];

    public DemoOpenings(DemoStation station, IReadOnlyList<DemoBand> bands, DemoWeather weather)
    {
        this.weather = weather;
        var all = DemoSource.All.Select(source => new DemoPath(source, station.Place)).ToArray();
        var loudest = all.Max(path => path.Weight(DemoUse.Mixture));
        paths = Array.FindAll(all, path => path.Weight(DemoUse.Mixture) >= LeastShare * loudest);
        weights = [.. paths.SelectMany(path => Enum.GetValues<DemoUse>().Select(path.Weight))];
        uses = [.. bands.Select(band => (int)band.Use)];
        megahertz = [.. bands.Select(band => band.Megahertz)];
        lossFactors = [.. bands.Select(band => DemoAbsorption.FrequencyFactor(band.Megahertz))];
        strengths = [.. bands.Select(band => band.StrengthDb + station.SensitivityDb)];
    }

    /// <summary>Highest usable frequency of the paths by hour, MHz, paths innermost; for a look from outside.</summary>
    public int PathCount => paths.Length;

    /// <summary>Computes a day.</summary>
    /// <param name="day">Days since 1970-01-01.</param>
    /// <param name="layer">Strength of the F layer against the usual.</param>
    /// <param name="noise">Noise above that of a rural place, dB, 24 x bands.</param>
    /// <param name="open">Receives the weight of what gets through, 24 x bands.</param>
    /// <param name="excess">Receives how far it stands above the noise, dB times weight, 24 x bands.</param>
    public void Fill(int day, float layer, ReadOnlySpan<float> noise, Span<float> open, Span<float> excess)
    {
        open.Clear();
        excess.Clear();
        var on = weather.On(day);
        Span<float> muf = stackalloc float[24];
        Span<float> loss = stackalloc float[24];
        Span<float> transmitting = stackalloc float[DemoSchedules.UseCount];
        for (var p = 0; p < paths.Length; p++)
        {
            Condition(paths[p], day, on, layer, muf, loss);
            for (var hour = 0; hour < 24; hour++)
            {
                var local = paths[p].Source.LocalHour(hour);
                for (var use = 0; use < transmitting.Length; use++)
                {
                    transmitting[use] = weights[p * transmitting.Length + use] * DemoSchedules.On((DemoUse)use, local, on.IsWeekend);
                }

                var row = hour * megahertz.Length;
                Add(transmitting, 1 / muf[hour], loss[hour], paths[p].DistanceDb, noise[row..], open[row..], excess[row..]);
            }
        }
    }

    // Highest usable frequency, and absorption as a term that f^-1.5 turns into decibels.
    private void Condition(DemoPath path, int day, DemoDay on, float layer, Span<float> muf, Span<float> loss)
    {
        muf.Fill(float.MaxValue);
        loss.Clear();
        var quiet = DemoAbsorption.QuietTerm(on.Activity);
        foreach (var point in path.Points)
        {
            point.Fill(on, cosZenith);
            DemoLayer.Light(cosZenith, light);
            for (var hour = 0; hour < 24; hour++)
            {
                var storm = weather.StormLossAt(day * 24 + hour);
                var critical = DemoLayer.CriticalMegahertz(light[hour], on.Activity) * point.LayerShare * (1 - storm * point.StormShare) * layer;
                muf[hour] = Math.Min(muf[hour], critical * path.MufFactor);
                loss[hour] += path.LossPerPoint * ((quiet + weather.FlareTermAt(day * 24 + hour)) * DemoAbsorption.CosineFactor(cosZenith[hour])
                    + quiet * Math.Max(0, storm) * point.AuroralShare);
            }
        }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Add(
        ReadOnlySpan<float> transmitting, float perMuf, float loss, float distanceDb, ReadOnlySpan<float> noise, Span<float> open, Span<float> excess)
    {
        for (var b = 0; b < megahertz.Length; b++)
        {
            var below = BelowMuf[(int)Math.Min(MufSteps, megahertz[b] * perMuf * MufScale)];
            var margin = strengths[b] - distanceDb - noise[b] - loss * lossFactors[b];
            var above = AboveNoise[(int)Math.Clamp(margin * MarginScale + MarginSteps / 2, 0, MarginSteps)];
            var heard = transmitting[uses[b]] * below * above;
            open[b] += heard;
            excess[b] += heard * margin;
        }
    }

    private static float Logistic(float x) => 1 / (1 + MathF.Exp(-x));
}
