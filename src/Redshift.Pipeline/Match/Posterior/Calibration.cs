using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>
/// The map from raw odds to the probability that the redshift is right: a logistic function of two documented numbers,
/// the ln odds against rivals and the ln odds against a featureless spectrum, both limited where they stop telling anything.
/// </summary>
internal static class Calibration
{
    /// <summary>No calibration sample supports a greater probability.</summary>
    public const double Greatest = 0.9995;

    private const double Offset = -3.2;
    private const double RivalSlope = 0.45;
    private const double FeatureSlope = 0.22;

    /// <summary>Calibrated probability of an answer.</summary>
    public static double Confidence(Decision decision)
    {
        var rivals = Math.Clamp(decision.LnOdds, -3, 12);
        var features = Math.Clamp(decision.LnOddsFeatures, -8, 25);
        return Math.Min(Greatest, 1 / (1 + Math.Exp(-(Offset + RivalSlope * rivals + FeatureSlope * features))));
    }

    /// <summary>The verdict that goes with a confidence.</summary>
    public static Verdict Verdict(double confidence, double lnOddsFeatures) => confidence switch
    {
        >= 0.99 => Results.Verdict.Firm,
        >= 0.9 => Results.Verdict.Likely,
        _ => lnOddsFeatures < NoObject ? Results.Verdict.Nothing : Results.Verdict.Unsettled,
    };

    /// <summary>Below these ln odds against a featureless spectrum there is no evidence of an object.</summary>
    private const double NoObject = 4;
}
