namespace Redshift.Physics.Statistics;

/// <summary>How good stated probabilities were, once it is known what came true.</summary>
public static class ProbabilityScores
{
    /// <summary>
    /// Mean squared difference of probability and outcome: 0 is perfect, 0.25 is what 0.5 for everything gets.
    /// Reference: G. W. Brier, Mon. Weather Rev. 78, 1 (1950).
    /// </summary>
    /// <param name="probabilities">Stated probabilities.</param>
    /// <param name="outcomes">Whether each came true.</param>
    /// <returns>The score.</returns>
    /// <exception cref="ArgumentException">The lengths differ or are zero.</exception>
    public static double Brier(ReadOnlySpan<double> probabilities, ReadOnlySpan<bool> outcomes)
    {
        RequirePairs(probabilities, outcomes);
        double sum = 0;
        for (int i = 0; i < probabilities.Length; i++)
        {
            double miss = probabilities[i] - (outcomes[i] ? 1 : 0);
            sum += miss * miss;
        }

        return sum / probabilities.Length;
    }

    /// <summary>
    /// Mean of minus the natural logarithm of the probability given to what happened; infinite if that was 0.
    /// Reference: I. J. Good, J. R. Statist. Soc. B 14, 107 (1952).
    /// </summary>
    /// <param name="probabilities">Stated probabilities.</param>
    /// <param name="outcomes">Whether each came true.</param>
    /// <returns>The score in nats; 0 is perfect.</returns>
    /// <exception cref="ArgumentException">The lengths differ or are zero.</exception>
    public static double Logarithmic(ReadOnlySpan<double> probabilities, ReadOnlySpan<bool> outcomes)
    {
        RequirePairs(probabilities, outcomes);
        double sum = 0;
        for (int i = 0; i < probabilities.Length; i++)
            sum -= Math.Log(outcomes[i] ? probabilities[i] : 1 - probabilities[i]);
        return sum / probabilities.Length;
    }

    /// <summary>
    /// Expected calibration error: the mean over equal bins of probability of |share that came true - mean
    /// probability|, weighted by their numbers. Reference: M. P. Naeini, G. F. Cooper and M. Hauskrecht, AAAI (2015).
    /// </summary>
    /// <param name="probabilities">Stated probabilities, 0 to 1.</param>
    /// <param name="outcomes">Whether each came true.</param>
    /// <param name="bins">Number of bins between 0 and 1.</param>
    /// <returns>The error, 0 for perfect calibration.</returns>
    /// <exception cref="ArgumentException">The lengths differ or are zero.</exception>
    public static double CalibrationError(ReadOnlySpan<double> probabilities, ReadOnlySpan<bool> outcomes, int bins = 10)
    {
        RequirePairs(probabilities, outcomes);
        var excess = new double[bins];
        for (int i = 0; i < probabilities.Length; i++)
        {
            int bin = Math.Min((int)(probabilities[i] * bins), bins - 1);
            excess[bin] += probabilities[i] - (outcomes[i] ? 1 : 0);
        }

        return excess.Sum(Math.Abs) / probabilities.Length;
    }

    private static void RequirePairs(ReadOnlySpan<double> probabilities, ReadOnlySpan<bool> outcomes)
    {
        if (probabilities.Length != outcomes.Length || probabilities.IsEmpty)
            throw new ArgumentException($"{probabilities.Length} probabilities do not pair with {outcomes.Length} outcomes.", nameof(outcomes));
    }
}
