namespace Bandtide.Testing.Simulation;

/// <summary>How often simulated intervals held the true mean.</summary>
/// <param name="Replicates">Number of intervals.</param>
/// <param name="Held">Number of those that held the true mean.</param>
/// <param name="Below">Number of those that lay wholly below it.</param>
/// <param name="MeanWidth">Mean width, in the unit of the values.</param>
/// <param name="TrueMean">The mean that is estimated.</param>
public sealed record CoverageResult(int Replicates, int Held, int Below, double MeanWidth, double TrueMean)
{
    /// <summary>Share of intervals that held the true mean, 0 to 1.</summary>
    public double Coverage => (double)Held / Replicates;

    /// <summary>Binomial standard error of <see cref="Coverage"/> if the true coverage is <paramref name="coverage"/>.</summary>
    public double StandardError(double coverage) => Math.Sqrt(coverage * (1 - coverage) / Replicates);
}
