namespace Redshift.Physics.Profiles;

/// <summary>
/// The Voigt profile of unit area: a Lorentzian (natural or collisional width) broadened by a Gaussian (thermal,
/// instrumental). All lengths in one unit of the caller's choice.
/// </summary>
public static class Voigt
{
    /// <summary>The profile at a point, to 1e-4 of its value.</summary>
    /// <param name="offset">Distance from the centre.</param>
    /// <param name="sigma">Standard deviation of the Gaussian, positive.</param>
    /// <param name="halfWidth">Half width at half maximum of the Lorentzian, not negative.</param>
    /// <returns>Density per unit length.</returns>
    /// <exception cref="ArgumentOutOfRangeException">A width is out of range.</exception>
    public static double Value(double offset, double sigma, double halfWidth)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(sigma);
        double scale = 1 / (Math.Sqrt(2) * sigma);
        return Faddeeva.W(offset * scale, halfWidth * scale).Real * scale / Math.Sqrt(Math.PI);
    }

    /// <summary>
    /// Full width at half maximum, to 0.03 %.
    /// Reference: J. J. Olivero and R. L. Longbothum, J. Quant. Spectrosc. Radiat. Transfer 17, 233 (1977).
    /// </summary>
    /// <param name="gaussianFwhm">Full width at half maximum of the Gaussian.</param>
    /// <param name="lorentzianFwhm">Full width at half maximum of the Lorentzian.</param>
    /// <returns>Full width at half maximum of their convolution.</returns>
    public static double FullWidth(double gaussianFwhm, double lorentzianFwhm)
        => 0.5346 * lorentzianFwhm + Math.Sqrt(0.2166 * lorentzianFwhm * lorentzianFwhm + gaussianFwhm * gaussianFwhm);
}
