namespace Redshift.Physics.Statistics;

/// <summary>Control of the share of false ones among many discoveries.</summary>
public static class FalseDiscovery
{
    /// <summary>
    /// The largest p-value that is still a discovery when at most a given share of the discoveries may be false.
    /// Reference: Y. Benjamini and Y. Hochberg, J. R. Statist. Soc. B 57, 289 (1995).
    /// </summary>
    /// <param name="pValues">The p-values of all tests made, in any order.</param>
    /// <param name="rate">Expected share of false discoveries, between 0 and 1.</param>
    /// <returns>The limit, itself included; null if there is no discovery.</returns>
    public static double? Threshold(ReadOnlySpan<double> pValues, double rate)
    {
        double[] sorted = pValues.ToArray();
        Array.Sort(sorted);
        for (int k = sorted.Length; k >= 1; k--)
        {
            if (sorted[k - 1] <= k * rate / sorted.Length)
                return sorted[k - 1];
        }

        return null;
    }
}
