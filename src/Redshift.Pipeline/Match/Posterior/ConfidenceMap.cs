namespace Redshift.Pipeline.Match.Posterior;

/// <summary>How the evidence for one kind of answer maps to the probability that the redshift is right: a logistic function.</summary>
/// <param name="Offset">Logit at even odds of a perfect fit.</param>
/// <param name="Near">Slope with the ln odds below the turn, not negative.</param>
/// <param name="Far">Slope with their logarithm beyond, not negative.</param>
/// <param name="Misfit">What a misfit costs, not negative.</param>
/// <param name="Greatest">The greatest confidence that the sample behind these numbers supports.</param>
public sealed record ConfidenceMap(double Offset, double Near, double Far, double Misfit, double Greatest = Calibration.Greatest)
{
    /// <summary>Where the odds turn from near to far.</summary>
    private const double Turn = 6;

    /// <summary>Odds beyond tell nothing more.</summary>
    private const double Reach = 3000;

    /// <summary>Probability that the redshift is right, its error aside.</summary>
    /// <param name="lnOdds">ln odds against rivals.</param>
    /// <param name="misfit">How badly the best model fits.</param>
    public double Probability(double lnOdds, double misfit)
    {
        var logit = Offset + Near * Math.Clamp(lnOdds, -3, Turn) + Far * Math.Log(1 + Math.Clamp(lnOdds - Turn, 0, Reach)) - Misfit * misfit;
        return 1 / (1 + Math.Exp(-logit));
    }

    /// <summary>Confidence in an answer.</summary>
    /// <param name="lnOdds">ln odds against rivals.</param>
    /// <param name="misfit">How badly the best model fits.</param>
    /// <param name="within">Chance that the error keeps within the tolerance.</param>
    public double Confidence(double lnOdds, double misfit, double within) => Math.Min(Greatest, Probability(lnOdds, misfit) * within);
}
