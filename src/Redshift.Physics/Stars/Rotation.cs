using System.Numerics;
using Redshift.Physics.Constants;

namespace Redshift.Physics.Stars;

/// <summary>Rotational broadening that is typical of a kind of star.</summary>
internal static class Rotation
{
    /// <summary>
    /// Standard deviation of the broadening in km/s: early-type dwarfs turn at v sin i of 100 to 150 km/s, stars cooler than F5 and white
    /// dwarfs slowly (Fukuda 1982, PASP 94, 271). A rotation profile of limb darkening 0.6 has a standard deviation of 0.47 v sin i.
    /// </summary>
    public static double Sigma(StellarParameters star)
    {
        if (star.Variant is not (StellarVariant.Normal or StellarVariant.EmissionLine))
            return 0;
        var early = Math.Clamp((star.TemperatureK - 6400) / 1400, 0, 1);
        return 0.47 * 120 * early * Math.Clamp((star.LogGravity - 1) / 2.5, 0.3, 1);
    }

    /// <summary>Spectrum convolved with a Gaussian; unchanged at the ends of the grid.</summary>
    public static float[] Broaden(float[] flux, double sigmaSteps)
    {
        var reach = (int)Math.Ceiling(3.5 * sigmaSteps);
        if (reach < 2)
            return flux;
        var offsets = Enumerable.Range(-reach, (2 * reach) + 1);
        var kernel = offsets.Select(i => (float)Math.Exp(-0.5 * i * i / (sigmaSteps * sigmaSteps))).ToArray();
        var norm = 1 / kernel.Sum();
        var broad = (float[])flux.Clone();
        var inside = broad.AsSpan(reach, flux.Length - (2 * reach));
        inside.Clear();
        for (var k = 0; k < kernel.Length; k++)
            AddScaled(inside, flux.AsSpan(k, inside.Length), norm * kernel[k]);
        return broad;
    }

    /// <summary>Broadening of a star in steps of a grid.</summary>
    public static double SigmaSteps(StellarParameters star, LogWavelengthGrid grid) =>
        Sigma(star) / Codata2022.SpeedOfLightKmS / grid.LnStep;

    private static void AddScaled(Span<float> sum, ReadOnlySpan<float> values, float factor)
    {
        var lanes = Vector<float>.Count;
        var i = 0;
        for (; i <= sum.Length - lanes; i += lanes)
            (new Vector<float>(sum[i..]) + (new Vector<float>(values[i..]) * factor)).CopyTo(sum[i..]);
        for (; i < sum.Length; i++)
            sum[i] += values[i] * factor;
    }
}
