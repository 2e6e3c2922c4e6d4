using MathNet.Numerics.Statistics;

namespace Redshift.Physics.Statistics;

/// <summary>Estimates of noise that lines and outliers do not spoil.</summary>
public static class RobustNoise
{
    /// <summary>Standard deviation of a normal distribution over its median absolute deviation.</summary>
    public const double SigmaPerMad = 1.4826022185056018;

    private const int Reach = 2;

    /// <summary>Standard deviation from the median absolute deviation from the median.</summary>
    /// <param name="values">At least one value; not changed.</param>
    /// <returns>The estimate in the unit of the values; NaN without values.</returns>
    public static double SigmaFromMad(ReadOnlySpan<double> values)
    {
        double[] work = values.ToArray();
        double median = ArrayStatistics.MedianInplace(work);
        for (int i = 0; i < work.Length; i++)
            work[i] = Math.Abs(work[i] - median);
        return SigmaPerMad * ArrayStatistics.MedianInplace(work);
    }

    /// <summary>
    /// Noise per pixel of a spectrum whose pixels are independent, from the second differences over two pixels, blind
    /// to a smooth continuum. Reference: F. Stoehr et al., ASP Conf. Ser. 394, 505 (2008).
    /// </summary>
    /// <param name="flux">Flux; exact zeros are taken as missing and left out.</param>
    /// <returns>Standard deviation in the unit of the flux; NaN with fewer than five values that are not zero.</returns>
    public static double FromSecondDifferences(ReadOnlySpan<double> flux)
    {
        double[] present = Array.FindAll(flux.ToArray(), value => value != 0);
        if (present.Length <= 2 * Reach)
            return double.NaN;
        var differences = new double[present.Length - 2 * Reach];
        for (int i = 0; i < differences.Length; i++)
            differences[i] = Math.Abs(2 * present[i + Reach] - present[i] - present[i + 2 * Reach]);
        // The variance of 2a - b - c is six times that of one pixel.
        return SigmaPerMad / Math.Sqrt(6) * ArrayStatistics.MedianInplace(differences);
    }
}
