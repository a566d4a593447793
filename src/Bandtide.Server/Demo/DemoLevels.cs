namespace Bandtide.Server.Demo;

/// <summary>
/// Quantiles of all levels of a cell, from its occupied share: noise below the threshold, signals above it. Invented shapes:
/// noise normal in decibels, signals exponential in decibels above the threshold.
/// </summary>
internal static class DemoLevels
{
    private const int Steps = 1000;
    private const double NoiseSpreadDb = 1.5;

    // For each occupied share: decibels above the floor where the quantile falls among noise, else NaN.
    private static readonly float[] MedianNoise = Noise(0.5);
    private static readonly float[] UpperNoise = Noise(0.9);

    // For each occupied share: how many times the median excess over the threshold.
    private static readonly float[] MedianSignal = Signal(0.5);
    private static readonly float[] UpperSignal = Signal(0.9);

    /// <summary>Median of all levels above the floor, dB.</summary>
    /// <param name="occupancy">0 to 1.</param>
    /// <param name="marginDb">Threshold above the floor.</param>
    /// <param name="excessDb">Median of the occupied levels above the threshold.</param>
    public static float MedianDb(float occupancy, float marginDb, float excessDb) => Of(MedianNoise, MedianSignal, occupancy, marginDb, excessDb);

    /// <summary>90th percentile of all levels above the floor, dB; parameters as for <see cref="MedianDb"/>.</summary>
    public static float UpperDb(float occupancy, float marginDb, float excessDb) => Of(UpperNoise, UpperSignal, occupancy, marginDb, excessDb);

    private static float Of(float[] noise, float[] signal, float occupancy, float marginDb, float excessDb)
    {
        var i = (int)(occupancy * Steps);
        return float.IsNaN(noise[i]) ? marginDb + excessDb * signal[i] : Math.Min(noise[i], marginDb - 0.2f);
    }

    private static float[] Noise(double quantile) => [.. Enumerable.Range(0, Steps + 1).Select(i =>
    {
        var quiet = 1 - i / (double)Steps;
        return quiet <= quantile ? float.NaN : (float)(NoiseSpreadDb * DemoRandom.NormalQuantile(Math.Min(0.995, quantile / quiet)));
    })];

    private static float[] Signal(double quantile) => [.. Enumerable.Range(0, Steps + 1).Select(i =>
    {
        var busy = i / (double)Steps;
        var within = busy == 0 ? 0 : Math.Clamp((quantile - (1 - busy)) / busy, 0, quantile);
        return (float)-Math.Log2(1 - within);
    })];
}
