using Redshift.Pipeline.Numerics;

namespace Redshift.Pipeline.Normalize;

/// <summary>
/// Where the night sky is bright, its subtraction leaves more than its photons' noise, and few reductions say so: the lines of OH then pass
/// for emission lines. The pixels of large stated errors are held against those of small ones, and believed as far as their own scatter allows.
/// </summary>
internal static class SkyRemains
{
    /// <summary>Pixels whose error is so many times the median around count as sky.</summary>
    private const double Brighter = 1.5;

    /// <summary>Pixels of which the median is taken.</summary>
    private const int Around = 256;

    /// <summary>Share of the pixels that deviate less: far out, as the remains of few lines are large.</summary>
    private const double Quantile = 0.9;

    private const int Fewest = 50;

    /// <summary>Raises the errors in the sky's lines, where their scatter asks for it.</summary>
    /// <param name="flux">Flux.</param>
    /// <param name="continuum">Its smooth part.</param>
    /// <param name="weight">Inverse variances, changed in place.</param>
    public static void Allow(float[] flux, float[] continuum, float[] weight)
    {
        var bright = Bright(weight);
        double Deviation(bool inSky)
        {
            var deviations = new float[flux.Length];
            var count = 0;
            for (var i = 0; i < flux.Length; i++)
                if (weight[i] > 0 && bright[i] == inSky) deviations[count++] = Math.Abs(flux[i] - continuum[i]) * MathF.Sqrt(weight[i]);
            return count < Fewest ? 0 : Selection.Take(deviations.AsSpan(0, count), (int)(Quantile * count));
        }

        double sky = Deviation(true), dark = Deviation(false);
        if (dark <= 0 || sky <= dark) return;
        var factor = (float)(dark * dark / (sky * sky));
        for (var i = 0; i < weight.Length; i++)
            if (bright[i]) weight[i] *= factor;
    }

    private static bool[] Bright(float[] weight)
    {
        var bright = new bool[weight.Length];
        foreach (var (start, end, median) in TypicalWeight.InBlocks(weight, Around))
            for (var i = start; i < end; i++) bright[i] = weight[i] < median / (Brighter * Brighter);
        return bright;
    }
}
