using Redshift.Physics.Constants;

namespace Redshift.Physics.Profiles;

/// <summary>Conversions between the measures of a line's width.</summary>
public static class LineWidth
{
    /// <summary>Full width at half maximum of a Gaussian over its standard deviation, 2 sqrt(2 ln 2).</summary>
    public const double FwhmPerSigma = 2.3548200450309493;

    /// <summary>Standard deviation of a Gaussian from its full width at half maximum, same unit.</summary>
    /// <param name="fwhm">Full width at half maximum.</param>
    /// <returns>Standard deviation.</returns>
    public static double SigmaFromFwhm(double fwhm) => fwhm / FwhmPerSigma;

    /// <summary>Full width at half maximum of a Gaussian from its standard deviation, same unit.</summary>
    /// <param name="sigma">Standard deviation.</param>
    /// <returns>Full width at half maximum.</returns>
    public static double FwhmFromSigma(double sigma) => sigma * FwhmPerSigma;

    /// <summary>Full width at half maximum, as a velocity, of a resolving power R = wavelength / FWHM.</summary>
    /// <param name="resolvingPower">R, positive.</param>
    /// <returns>km/s.</returns>
    public static double FwhmKmS(double resolvingPower) => Codata2022.SpeedOfLightKmS / resolvingPower;

    /// <summary>Standard deviation, as a velocity, of a resolving power R = wavelength / FWHM.</summary>
    /// <param name="resolvingPower">R, positive.</param>
    /// <returns>km/s.</returns>
    public static double SigmaKmS(double resolvingPower) => SigmaFromFwhm(FwhmKmS(resolvingPower));

    /// <summary>Resolving power from the full width at half maximum of an unresolved line.</summary>
    /// <param name="fwhmKmS">Width in km/s, positive.</param>
    /// <returns>R = wavelength / FWHM.</returns>
    public static double ResolvingPower(double fwhmKmS) => Codata2022.SpeedOfLightKmS / fwhmKmS;

    /// <summary>
    /// Width of a Gaussian after another broadening is taken out in quadrature: of an observed line after the
    /// instrument, of an instrument after a template.
    /// </summary>
    /// <param name="observed">Width, any measure.</param>
    /// <param name="instrument">Width to take out, the same measure and unit.</param>
    /// <returns>The intrinsic width, zero where the line is narrower than the instrument.</returns>
    public static double Intrinsic(double observed, double instrument)
        => Math.Sqrt(Math.Max(0, observed * observed - instrument * instrument));
}
