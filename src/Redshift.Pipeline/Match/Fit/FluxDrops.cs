using Redshift.Pipeline.Match.Models;

namespace Redshift.Pipeline.Match.Fit;

/// <summary>Places where the flux drops towards shorter wavelengths, the plainest first: candidates for Lyman limits of clouds in front.</summary>
internal static class FluxDrops
{
    /// <summary>Width in ln λ of the stretches on both sides that are compared: the forest's own scatter averages out over it.</summary>
    public const double Window = 0.02;

    private const double LeastSigmas = 3;
    private const int MostKept = 24;

    /// <summary>Finds drops.</summary>
    /// <returns>ln of their wavelengths in Å.</returns>
    public static IReadOnlyList<double> Find(FitPixels pixels)
    {
        var drops = new List<(double LnWavelength, double Sigmas)>();
        for (var s = 0; s + 1 < pixels.Starts.Length; s++) Find(pixels, pixels.Starts[s], pixels.Starts[s + 1], drops);
        return [.. drops.OrderByDescending(d => d.Sigmas).Take(MostKept).Select(d => d.LnWavelength)];
    }

    private static void Find(FitPixels pixels, int start, int end, List<(double LnWavelength, double Sigmas)> drops)
    {
        var (weights, fluxes) = (new double[end - start + 1], new double[end - start + 1]);
        for (var p = start; p < end; p++)
        {
            weights[p - start + 1] = weights[p - start] + pixels.Weight[p];
            fluxes[p - start + 1] = fluxes[p - start] + (double)pixels.Weight[p] * pixels.Flux[p];
        }

        (double LnWavelength, double Sigmas) best = (0, 0);
        int low = 0, high = 0;
        for (var p = 0; p < end - start; p++)
        {
            var here = pixels.LnWavelength[start + p];
            while (pixels.LnWavelength[start + low] < here - Window) low++;
            while (high < end - start && pixels.LnWavelength[start + high] < here + Window) high++;
            if (here > best.LnWavelength + Window && best.Sigmas > 0)
            {
                drops.Add(best);
                best = (0, 0);
            }

            var sigmas = Sigmas(weights[p] - weights[low], fluxes[p] - fluxes[low], p - low, weights[high] - weights[p], fluxes[high] - fluxes[p], high - p);
            if (sigmas > Math.Max(LeastSigmas, best.Sigmas)) best = (here, sigmas);
        }

        if (best.Sigmas > 0) drops.Add(best);
    }

    private static double Sigmas(double leftWeight, double leftSum, int leftCount, double rightWeight, double rightSum, int rightCount)
    {
        if (leftWeight <= 0 || rightWeight <= 0) return 0;
        double left = leftSum / leftWeight, right = rightSum / rightWeight;
        var variance = 1 / leftWeight + 1 / rightWeight + Forest.ScatterShare * Forest.ScatterShare * (left * left / leftCount + right * right / rightCount);
        return (right - left) / Math.Sqrt(variance);
    }
}
