using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>
/// The map from raw odds to the probability that the redshift is right within its tolerance: a logistic function of documented numbers
/// (the ln odds against rivals, nearly linear while small and logarithmic beyond, for models err more often than their odds admit; how badly
/// the best model fits; and the kind, for broad lines are easily taken for each other and stars are all at one place), times the chance that
/// the error keeps within the tolerance. The coefficients are a maximum-likelihood fit to 2,941 simulated observations (seeds 7 to 12 and 20 to 23 of the
/// evaluation program, 300 each, written with its option for features), which are not drawn from the engine's models, rounded; its command
/// calibrate makes them anew, and a pipeline file can state others. Cross-validated in five parts they score 0.208 nats an answer for galaxies, 0.242 for quasars, 0.159 for the rest.
/// </summary>
internal static class Calibration
{
    /// <summary>No calibration sample supports a greater probability.</summary>
    public const double Greatest = 0.999;

    /// <summary>Confidence from which an answer is firm.</summary>
    public const double Firm = 0.99;

    /// <summary>For answers that are galaxies.</summary>
    public static readonly ConfidenceMap Galaxies = new(-0.6, 0.16, 1.38, 0);

    /// <summary>For quasars.</summary>
    public static readonly ConfidenceMap Quasars = new(-0.5, 0.12, 0.9, 0.5);

    /// <summary>For stars and all else.</summary>
    public static readonly ConfidenceMap Others = new(0, 0.05, 1.24, 0);

    /// <summary>Below these ln odds against a featureless spectrum there is no evidence of an object.</summary>
    private const double NoFeatures = 8;

    /// <summary>Chance that a normal error keeps within a tolerance.</summary>
    public static double Within(double errorKmS, double toleranceKmS) => 2 * Math.Exp(HalfNormalEvidence.LnTail(toleranceKmS / errorKmS)) - 1;

    /// <summary>The verdict that goes with a confidence.</summary>
    public static Verdict Verdict(double confidence, double lnOddsFeatures, bool hasContinuum) => confidence switch
    {
        >= Firm => Results.Verdict.Firm,
        >= 0.9 => Results.Verdict.Likely,
        _ => lnOddsFeatures < NoFeatures && !hasContinuum ? Results.Verdict.Nothing : Results.Verdict.Unsettled,
    };
}
