using Redshift.Physics.Units;

namespace Redshift.Pipeline.Normalize;

/// <summary>
/// The airglow's green line of oxygen, [O I] 5577, by far the brightest of the dark sky in the visible. What its subtraction leaves is no
/// noise and passes for the emission line of a galaxy. Where a file states no errors nothing warns of it: these pixels are left out
/// (common practice). Stated errors know of the line, and a galaxy's own line may stand there.
/// </summary>
internal static class GreenLine
{
    /// <summary>ln of its vacuum wavelength in Å (NIST: 5577.339 Å in air).</summary>
    private static readonly double LnWavelength = Math.Log(5578.887);

    /// <summary>Half width of the mask in σ of the line spread, and the Earth's motion where it was taken out.</summary>
    private const double Sigmas = 2.5;
    private const double EarthMotion = 30 / Velocity.SpeedOfLightKmS;

    /// <summary>Takes the weight from the pixels of the line.</summary>
    /// <param name="lnWavelength">ln λ of the pixels, vacuum, increasing.</param>
    /// <param name="sigmaLn">σ of the line spread in ln λ.</param>
    /// <param name="weight">Inverse variances, changed in place.</param>
    public static void Mask(double[] lnWavelength, float[] sigmaLn, float[] weight)
    {
        var near = Array.BinarySearch(lnWavelength, LnWavelength);
        if (near < 0) near = Math.Min(~near, lnWavelength.Length - 1);
        var reach = Sigmas * sigmaLn[near] + EarthMotion;
        for (var i = 0; i < weight.Length; i++)
            if (Math.Abs(lnWavelength[i] - LnWavelength) < reach) weight[i] = 0;
    }
}
