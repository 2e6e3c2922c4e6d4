using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>
/// The map from raw odds to the probability that the redshift is right: a logistic function of three documented numbers, limited where
/// they stop telling anything: the ln odds against rivals, the ln odds against a featureless spectrum, and how badly the best model fits.
/// </summary>
internal static class Calibration
{
    /// <summary>No calibration sample supports a greater probability.</summary>
    public const double Greatest = 0.999;

    private const double Offset = -3.4;
    private const double RivalSlope = 0.42;
    private const double FeatureSlope = 0.22;
    private const double MisfitSlope = 1.1;

    /// <summary>Below these ln odds against a featureless spectrum there is no evidence of an object.</summary>
    private const double NoFeatures = 4;

    /// <summary>Calibrated probability of an answer.</summary>
    public static double Confidence(Decision decision, MatchResult match)
    {
        var rivals = Math.Clamp(decision.LnOdds, -3, 14);
        var features = Math.Clamp(decision.LnOddsFeatures, -8, 25);
        var misfit = Math.Log(match.Error.Greatest / Fit.ModelError.Least);
        return Math.Min(Greatest, 1 / (1 + Math.Exp(-(Offset + RivalSlope * rivals + FeatureSlope * features - MisfitSlope * misfit))));
    }

    /// <summary>The verdict that goes with a confidence.</summary>
    public static Verdict Verdict(double confidence, double lnOddsFeatures, bool hasContinuum) => confidence switch
    {
        >= 0.99 => Results.Verdict.Firm,
        >= 0.9 => Results.Verdict.Likely,
        _ => lnOddsFeatures < NoFeatures && !hasContinuum ? Results.Verdict.Nothing : Results.Verdict.Unsettled,
    };
}
