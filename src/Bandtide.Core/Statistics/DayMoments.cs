namespace Bandtide.Core.Statistics;

/// <summary>What the deviations of days from the means of their months tell about their variance and lag-1 correlation.</summary>
/// <remarks>
/// The correlation is estimated over neighbouring dates of one month and corrected for the bias that the subtracted mean causes,
/// -(1 + 4r)/n (Kendall 1954, Biometrika 41, 403-404; Marriott and Pope 1954, same volume, 390-402). As a month
/// tells little about it, it is drawn towards <see cref="AssumedCorrelation"/> with the weight of <see cref="AssumedPairs"/> pairs of
/// days: an assumption of this program, no source, chosen by simulated coverage. Months of under six days leave it there.
/// Negative correlation counts as none.
/// </remarks>
internal struct DayMoments
{
    /// <summary>The lag-1 correlation that is believed before looking.</summary>
    public const double AssumedCorrelation = 0.4;

    /// <summary>How many pairs of days that belief is worth.</summary>
    public const double AssumedPairs = 5;

    private const double LargestCorrelation = 0.95;
    private const int FewestDaysForCorrelation = 6;

    private double weight;
    private double products;
    private double productWeight;
    private double pairsPerDay;

    /// <summary>Sum of weight times squared deviation.</summary>
    public double Squares { get; private set; }

    /// <summary>Days less months.</summary>
    public int Freedom { get; private set; }

    /// <summary>Pairs of neighbouring dates in months of enough days.</summary>
    public int Pairs { get; private set; }

    /// <summary>The lag-1 correlation, 0 to 0.95.</summary>
    public readonly double Correlation
    {
        get
        {
            var raw = Pairs == 0 || Squares <= 0 ? 0 : products / productWeight / (Squares / weight);
            var corrected = (Pairs * raw + pairsPerDay + AssumedPairs * AssumedCorrelation) / (Pairs - 4 * pairsPerDay + AssumedPairs);
            return Math.Clamp(corrected, 0, LargestCorrelation);
        }
    }

    /// <summary>Adds the days of one month; those without a deviation are passed over.</summary>
    public void AddMonth(DaySpans days)
    {
        var (known, pairs, monthProducts, monthWeight) = (0, 0, 0.0, 0.0);
        for (var i = 0; i < days.Days.Length; i++)
        {
            if (days.Counts[i] == 0)
            {
                continue;
            }

            known++;
            weight += days.Weights[i];
            Squares += (double)days.Weights[i] * days.Deviations[i] * days.Deviations[i];
            if (i > 0 && days.Days[i] == days.Days[i - 1] + 1 && days.Counts[i - 1] > 0)
            {
                double lighter = Math.Min(days.Weights[i], days.Weights[i - 1]);
                monthProducts += lighter * days.Deviations[i] * days.Deviations[i - 1];
                monthWeight += lighter;
                pairs++;
            }
        }

        Freedom += Math.Max(0, known - 1);
        if (known >= FewestDaysForCorrelation)
        {
            products += monthProducts;
            productWeight += monthWeight;
            Pairs += pairs;
            pairsPerDay += pairs / (known - 1.0);
        }
    }
}
