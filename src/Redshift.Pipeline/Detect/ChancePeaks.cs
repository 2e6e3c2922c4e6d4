using Redshift.Physics.Profiles;

namespace Redshift.Pipeline.Detect;

/// <summary>
/// The statistics of local maxima of filtered noise. Tests are made on local maxima, not on pixels, so that the rate of false discoveries
/// is one of features (Schwartzman, Gavrilov &amp; Adler 2011, Ann. Statist. 39, 3290).
/// </summary>
internal static class ChancePeaks
{
    /// <summary>
    /// Probability that a local maximum of white noise filtered by a Gaussian is higher than u standard deviations: the distribution of
    /// Cramér &amp; Leadbetter (1967, Stationary and Related Stochastic Processes, ch. 11) with λ₂²/(λ₀λ₄) = 1/3 for that filter.
    /// </summary>
    public static double Probability(double u) =>
        Above(u * Math.Sqrt(1.5)) + Math.Exp(-0.5 * u * u) / Math.Sqrt(3) * Above(-u / Math.Sqrt(2));

    /// <summary>
    /// The lowest height that is a discovery when at most a share of the discoveries may be false, by the step-up rule of
    /// Benjamini &amp; Hochberg (1995, J. R. Statist. Soc. B 57, 289).
    /// </summary>
    /// <param name="heights">Heights worth testing, descending; lower ones need not be given.</param>
    /// <param name="tests">How many maxima were looked at in all.</param>
    /// <param name="rate">Greatest expected share of false discoveries.</param>
    /// <returns>The height, itself included; infinite for no discovery.</returns>
    public static double Threshold(ReadOnlySpan<double> heights, int tests, double rate)
    {
        for (var k = heights.Length; k >= 1; k--)
            if (Probability(heights[k - 1]) <= k * rate / tests) return heights[k - 1];
        return double.PositiveInfinity;
    }

    /// <summary>Upper tail of the normal distribution; beyond 40σ nothing is left.</summary>
    private static double Above(double x) => Gaussian.Area(x, 40, 1);
}
