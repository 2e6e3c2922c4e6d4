using System.Runtime.InteropServices;
using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>A rough, positive level of a spectrum: medians of blocks, joined and smoothed; never below what the noise allows to tell from zero.</summary>
internal static class Baseline
{
    /// <summary>Width of a block in ln λ.</summary>
    private const double Block = 0.05;

    /// <summary>Estimates the level at the pixels.</summary>
    /// <param name="lnWavelength">ln λ, increasing.</param>
    /// <param name="flux">Flux.</param>
    /// <param name="weight">Inverse variance, 0 unusable.</param>
    public static float[] Estimate(double[] lnWavelength, float[] flux, float[] weight)
    {
        var blocks = Math.Max(2, (int)Math.Ceiling((lnWavelength[^1] - lnWavelength[0]) / Block));
        var width = (lnWavelength[^1] - lnWavelength[0]) / blocks + 1e-12;
        var levels = Smooth(Smooth(Levels(lnWavelength, flux, weight, blocks, width)));
        var baseline = new float[flux.Length];
        for (var i = 0; i < baseline.Length; i++)
        {
            var x = Math.Clamp((lnWavelength[i] - lnWavelength[0]) / width - 0.5, 0, blocks - 1);
            var b = Math.Min((int)x, blocks - 2);
            baseline[i] = (float)Math.Exp(levels[b] + (x - b) * (levels[b + 1] - levels[b]));
        }

        return baseline;
    }

    /// <summary>ln of each block's level; blocks without data take their neighbour's.</summary>
    private static double[] Levels(double[] lnWavelength, float[] flux, float[] weight, int blocks, double width)
    {
        var levels = new double[blocks];
        var values = new List<double>();
        var noise = new List<double>();
        for (int b = 0, i = 0; b < blocks; b++)
        {
            values.Clear();
            noise.Clear();
            for (; i < flux.Length && lnWavelength[i] - lnWavelength[0] < (b + 1) * width; i++)
            {
                if (weight[i] <= 0) continue;
                values.Add(flux[i]);
                noise.Add(1 / Math.Sqrt(weight[i]));
            }

            levels[b] = values.Count == 0 ? double.NaN
                : Math.Log(Math.Max(Math.Max(Selection.Median(CollectionsMarshal.AsSpan(values)), 0.3 * Selection.Median(CollectionsMarshal.AsSpan(noise))), 1e-6));
        }

        Continue(levels);
        return levels;
    }

    private static void Continue(double[] levels)
    {
        for (var b = 1; b < levels.Length; b++)
            if (double.IsNaN(levels[b])) levels[b] = levels[b - 1];
        for (var b = levels.Length - 2; b >= 0; b--)
            if (double.IsNaN(levels[b])) levels[b] = levels[b + 1];
    }

    private static double[] Smooth(double[] levels)
    {
        var smooth = new double[levels.Length];
        for (var b = 0; b < levels.Length; b++)
            smooth[b] = 0.25 * levels[Math.Max(0, b - 1)] + 0.5 * levels[b] + 0.25 * levels[Math.Min(levels.Length - 1, b + 1)];
        return smooth;
    }
}
