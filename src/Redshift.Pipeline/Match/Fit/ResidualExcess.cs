namespace Redshift.Pipeline.Match.Fit;

/// <summary>
/// How much larger, and how much more alike from pixel to pixel, the residuals of the best model are than noise would be.
/// A likelihood that takes them for independent noise is too sharp by this factor; all ln evidences are divided by it.
/// </summary>
internal static class ResidualExcess
{
    private const int Lags = 12;

    /// <summary>χ² per pixel times 1 + 2Σρ, the variance of sums of neighbouring residuals over that of white noise; at least 1.</summary>
    /// <param name="pixels">The pixels.</param>
    /// <param name="model">The best model on them.</param>
    public static double Measure(FitPixels pixels, float[] model)
    {
        var residuals = new double[pixels.Count];
        for (var p = 0; p < residuals.Length; p++)
            residuals[p] = Math.Clamp((pixels.Flux[p] - model[p]) * Math.Sqrt(pixels.Weight[p]), -6, 6);
        var variance = Correlation(residuals, 0);
        if (variance <= 0) return 1;
        var sum = variance;
        for (var lag = 1; lag <= Lags; lag++) sum += 2 * Math.Max(0, Correlation(residuals, lag)) * (1 - lag / (Lags + 1.0));
        return Math.Max(1, sum);
    }

    private static double Correlation(double[] residuals, int lag)
    {
        double sum = 0;
        for (var i = lag; i < residuals.Length; i++) sum += residuals[i] * residuals[i - lag];
        return sum / residuals.Length;
    }
}
