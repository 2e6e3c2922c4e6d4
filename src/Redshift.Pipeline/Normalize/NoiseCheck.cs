using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>What the scatter between near pixels says of the errors that a file states.</summary>
/// <param name="Scale">True noise over stated noise.</param>
/// <param name="Correlation">Variance of a sum of neighbours over that of independent pixels, 1 for white noise.</param>
internal readonly record struct NoiseState(double Scale, double Correlation);

/// <summary>
/// Measures the noise from second differences of pixels three apart, which cancel a smooth spectrum
/// (the idea of DER_SNR, Stoehr et al. 2008, ASP Conf. 394, 505, with a wider step so that resampled, correlated pixels do not hide noise).
/// </summary>
internal static class NoiseCheck
{
    private const int Step = 3;
    private const int Window = 128;

    /// <summary>1.4826/√6: normal standard deviation from the median of |2x₀ − x₋ − x₊|.</summary>
    private const double MedianToSigma = 0.6052697;

    /// <summary>Compares the scatter of flux/error with one.</summary>
    /// <param name="standardised">Flux over its stated error at the usable pixels, in order.</param>
    /// <remarks>
    /// Lines add to the scatter where they are; the lower quartile over windows is what the quietest stretches say.
    /// At least one window must exist, else the state is (1, 1).
    /// </remarks>
    public static NoiseState Measure(ReadOnlySpan<double> standardised)
    {
        var scales = new List<double>();
        var near = new List<double>();
        for (var start = 0; start + Window <= standardised.Length; start += Window)
        {
            var window = standardised.Slice(start, Window);
            scales.Add(Scatter(window, Step));
            near.Add(Scatter(window, 1));
        }

        if (scales.Count == 0)
        {
            if (standardised.Length < 4 * Step) return new(1, 1);
            scales.Add(Scatter(standardised, Step));
            near.Add(Scatter(standardised, 1));
        }

        var quiet = Quantile(scales, 0.25);
        return new(quiet * SmallSampleFactor(scales.Count), CorrelationFrom(Quantile(near, 0.25), quiet));
    }

    /// <summary>Standard deviation of the noise within a window.</summary>
    public static double Scatter(ReadOnlySpan<double> values, int step)
    {
        var count = Math.Max(0, values.Length - 2 * step);
        var differences = count <= 2 * Window ? stackalloc double[count] : new double[count];
        for (var i = 0; i < differences.Length; i++)
            differences[i] = Math.Abs(2 * values[i + step] - values[i] - values[i + 2 * step]);
        return MedianToSigma * Selection.Median(differences);
    }

    /// <summary>
    /// With lag-one correlation ρ₁ and ρ₂ ≈ ρ₁/4, var(2x₀−x₋−x₊) = σ²(6 − 8ρ₁ + 2ρ₂): the ratio of near to wide scatter gives ρ₁,
    /// and sums of many pixels have the variance 1 + 2ρ₁ + 2ρ₂ of independent ones.
    /// </summary>
    private static double CorrelationFrom(double near, double wide)
    {
        if (wide <= 0) return 1;
        var rho = (1 - near * near / (wide * wide)) * 6 / 7.5;
        return 1 + 2.5 * Math.Clamp(rho - 0.05, 0, 0.6);
    }

    /// <summary>The lower quartile of few noisy estimates is low by their own scatter, some 10 % a window of this size.</summary>
    private static double SmallSampleFactor(int windows) => windows >= 3 ? 1.06 : 1;

    private static double Quantile(List<double> values, double share)
    {
        var sorted = values.ToArray();
        Array.Sort(sorted);
        return sorted[(int)(share * (sorted.Length - 1))];
    }
}
