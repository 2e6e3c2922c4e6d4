using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>
/// The map from raw odds to the probability that the redshift is right within its tolerance: a logistic function of documented numbers
/// (the ln odds against rivals, nearly linear while small and logarithmic beyond, for models err more often than their odds admit; how badly
/// the best model fits; and the kind, for broad lines are easily taken for each other and stars are all at one place), times the chance that
/// the error keeps within the tolerance. The coefficients are a maximum-likelihood fit to 2,347 simulated observations (seeds 7 to 12, 20 and 21 of the
/// evaluation program, 300 each, written with its option for features), which are not drawn from the engine's models, rounded; its command
/// calibrate makes them anew. Cross-validated in five parts they score 0.214 nats an answer for galaxies, 0.299 for quasars, 0.149 for the rest.
/// </summary>
internal static class Calibration
{
    /// <summary>No calibration sample supports a greater probability.</summary>
    public const double Greatest = 0.999;

    private static readonly Map Galaxies = new(-0.9, 0.26, 1.0, 0);
    private static readonly Map Quasars = new(-0.6, 0, 0.93, 0.47);
    private static readonly Map Others = new(0.45, 0.08, 1.2, 0.17);

    /// <summary>Where the odds turn from near to far.</summary>
    private const double Turn = 6;

    /// <summary>Odds beyond tell nothing more.</summary>
    private const double Reach = 3000;

    /// <summary>Below these ln odds against a featureless spectrum there is no evidence of an object.</summary>
    private const double NoFeatures = 8;

    /// <summary>Calibrated probability of an answer.</summary>
    /// <param name="match">What matching gave.</param>
    /// <param name="errorKmS">1σ of the answer.</param>
    /// <param name="toleranceKmS">How far off the answer may be and still be right.</param>
    public static double Confidence(MatchResult match, double errorKmS, double toleranceKmS)
    {
        var map = Of(match.Decision.Answer.Fit.Model.Kind);
        return Math.Min(Greatest, map.Probability(match.Decision.LnOdds, match.Misfit) * Within(errorKmS, toleranceKmS));
    }

    /// <summary>Chance that a normal error keeps within a tolerance.</summary>
    public static double Within(double errorKmS, double toleranceKmS) => 2 * Math.Exp(HalfNormalEvidence.LnTail(toleranceKmS / errorKmS)) - 1;

    private static Map Of(ObjectKind kind) => kind switch
    {
        ObjectKind.Galaxy => Galaxies,
        ObjectKind.Quasar => Quasars,
        _ => Others,
    };

    /// <summary>The verdict that goes with a confidence.</summary>
    public static Verdict Verdict(double confidence, double lnOddsFeatures, bool hasContinuum) => confidence switch
    {
        >= 0.99 => Results.Verdict.Firm,
        >= 0.9 => Results.Verdict.Likely,
        _ => lnOddsFeatures < NoFeatures && !hasContinuum ? Results.Verdict.Nothing : Results.Verdict.Unsettled,
    };

    /// <summary>Coefficients of one kind.</summary>
    /// <param name="Offset">Logit at even odds of a perfect fit.</param>
    /// <param name="Near">Slope with the ln odds below the turn.</param>
    /// <param name="Far">Slope with their logarithm beyond.</param>
    /// <param name="Misfit">What a misfit costs.</param>
    internal readonly record struct Map(double Offset, double Near, double Far, double Misfit)
    {
        /// <summary>Probability that the redshift is right, its error aside.</summary>
        /// <param name="lnOdds">ln odds against rivals.</param>
        /// <param name="misfit">How badly the best model fits.</param>
        public double Probability(double lnOdds, double misfit)
        {
            var logit = Offset + Near * Math.Clamp(lnOdds, -3, Turn) + Far * Math.Log(1 + Math.Clamp(lnOdds - Turn, 0, Reach)) - Misfit * misfit;
            return 1 / (1 + Math.Exp(-logit));
        }
    }
}
