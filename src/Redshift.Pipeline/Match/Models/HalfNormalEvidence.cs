namespace Redshift.Pipeline.Match.Models;

/// <summary>
/// Marginal likelihood of one non-negative amplitude with a truncated normal prior, and its mixture with absence.
/// The likelihood is exp(v·a − M·a²/2); all integrals are Gaussian (textbook).
/// </summary>
internal static class HalfNormalEvidence
{
    /// <summary>ln of (1−absent)·BF + absent.</summary>
    /// <param name="gradient">v: data against the column.</param>
    /// <param name="curvature">M: the column against itself, zero or more.</param>
    /// <param name="mean">Prior mean of the amplitude.</param>
    /// <param name="spread">Prior σ of the amplitude, positive.</param>
    /// <param name="absent">Prior probability that the amplitude is zero.</param>
    public static double LnMixture(double gradient, double curvature, double mean, double spread, double absent) =>
        LnMixture(LnBayesFactor(gradient, curvature, mean, spread), absent);

    /// <summary>ln of (1−absent)·BF + absent.</summary>
    /// <param name="bayes">ln BF, see <see cref="LnBayesFactor"/>.</param>
    /// <param name="absent">Prior probability that the amplitude is zero.</param>
    public static double LnMixture(double bayes, double absent) =>
        bayes > 30 ? bayes + Math.Log(1 - absent) : Math.Log(absent + (1 - absent) * Math.Exp(bayes));

    /// <summary>ln of the likelihood averaged over the prior, over that at amplitude zero.</summary>
    public static double LnBayesFactor(double gradient, double curvature, double mean, double spread)
    {
        var precision = 1 / (spread * spread);
        double m = curvature + precision, v = gradient + mean * precision, root = Math.Sqrt(m);
        return LnTail(v / root) + 0.5 * v * v / m - LnTail(mean / spread) - 0.5 * mean * mean * precision - 0.5 * Math.Log(m * spread * spread);
    }

    /// <summary>ln Φ(x), the normal distribution's share below x, to some 1e-3 (continued fraction of Mills' ratio below −3).</summary>
    public static double LnTail(double x)
    {
        if (x > 3) return 0;
        if (x < -3) return -0.5 * x * x - Math.Log(2.5066282746310002 * (-x + 1 / (-x + 2 / (-x + 3 / (-x + 4 / -x)))));
        // Abramowitz & Stegun 26.2.17, |error| < 7.5e-8.
        var t = 1 / (1 + 0.2316419 * Math.Abs(x));
        var tail = Math.Exp(-0.5 * x * x) * 0.3989422804014327
            * (t * (0.319381530 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429)))));
        return Math.Log(x >= 0 ? 1 - tail : tail);
    }
}
