using Redshift.Pipeline.Match.Models;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>
/// The map from raw odds to the probability that the redshift is right within its tolerance: a logistic function of documented numbers
/// (the ln odds against rivals, nearly linear while small and logarithmic beyond, for models err more often than their odds admit; and how
/// badly the best model fits), times the chance that the error keeps within the tolerance. The coefficients are a maximum-likelihood fit to
/// 666 simulated observations (seeds 6 and 7 of the evaluation program, written with its option for features), which are not drawn from
/// the engine's models, rounded.
/// </summary>
internal static class Calibration
{
    /// <summary>No calibration sample supports a greater probability.</summary>
    public const double Greatest = 0.999;

    private const double Offset = -0.9;
    private const double NearSlope = 0.2;
    private const double FarSlope = 0.95;
    private const double MisfitSlope = 0.06;

    /// <summary>Where the odds turn from near to far.</summary>
    private const double Turn = 6;

    /// <summary>Below these ln odds against a featureless spectrum there is no evidence of an object.</summary>
    private const double NoFeatures = 8;

    /// <summary>Calibrated probability of an answer.</summary>
    /// <param name="match">What matching gave.</param>
    /// <param name="errorKmS">1σ of the answer.</param>
    /// <param name="toleranceKmS">How far off the answer may be and still be right.</param>
    public static double Confidence(MatchResult match, double errorKmS, double toleranceKmS)
    {
        var odds = match.Decision.LnOdds;
        var logit = Offset + NearSlope * Math.Clamp(odds, -3, Turn) + FarSlope * Math.Log(1 + Math.Clamp(odds - Turn, 0, 300)) - MisfitSlope * match.Misfit;
        var within = 2 * Math.Exp(HalfNormalEvidence.LnTail(toleranceKmS / errorKmS)) - 1;
        return Math.Min(Greatest, within / (1 + Math.Exp(-logit)));
    }

    /// <summary>The verdict that goes with a confidence.</summary>
    public static Verdict Verdict(double confidence, double lnOddsFeatures, bool hasContinuum) => confidence switch
    {
        >= 0.99 => Results.Verdict.Firm,
        >= 0.9 => Results.Verdict.Likely,
        _ => lnOddsFeatures < NoFeatures && !hasContinuum ? Results.Verdict.Nothing : Results.Verdict.Unsettled,
    };
}
