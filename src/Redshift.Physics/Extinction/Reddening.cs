using Redshift.Physics.Hydrogen;

namespace Redshift.Physics.Extinction;

/// <summary>Reddening and its removal.</summary>
public static class Reddening
{
    /// <summary>The fraction of light that passes an extinction.</summary>
    /// <param name="magnitudes">Extinction in magnitudes.</param>
    /// <returns>10^(-0.4 A).</returns>
    public static double Transmission(double magnitudes) => Math.Pow(10, -0.4 * magnitudes);

    /// <summary>The colour excess that explains a Balmer decrement by Galactic dust (Cardelli et al. 1989).</summary>
    /// <param name="observedRatio">Observed flux of H alpha over that of H beta.</param>
    /// <param name="intrinsicRatio">The ratio without dust: 2.86 for case B at 10000 K.</param>
    /// <param name="ratio">A(V)/E(B-V).</param>
    /// <returns>E(B-V) in magnitudes; negative if the observed ratio is below the intrinsic one.</returns>
    public static double FromBalmerDecrement(
        double observedRatio, double intrinsicRatio = 2.86, double ratio = ExtinctionCurves.GalacticRatio)
    {
        double alpha = ratio * ExtinctionCurves.Cardelli(HydrogenicAtom.Hydrogen.Wavelength(3, 2), ratio);
        double beta = ratio * ExtinctionCurves.Cardelli(HydrogenicAtom.Hydrogen.Wavelength(4, 2), ratio);
        return 2.5 / (beta - alpha) * Math.Log10(observedRatio / intrinsicRatio);
    }
}
