using Redshift.Physics.Units;
using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>1σ of a redshift: the curvature of the likelihood, and floors for what no likelihood knows.</summary>
internal static class RedshiftError
{
    private const double KmSPerLn = Velocity.SpeedOfLightKmS;

    /// <summary>
    /// Wavelength calibration and the shape of the line spread are rarely known better than to this share of its FWHM: where the file states the
    /// resolution, a pipeline measured lamps with care; where it does not, nobody may have (common practice; agrees with the scatter of
    /// simulated instruments).
    /// </summary>
    private const double ShareWhereStated = 0.025;
    private const double ShareWhereEstimated = 0.07;

    /// <summary>σ of ln(1+z).</summary>
    /// <param name="fit">The answer.</param>
    /// <param name="resolution">Resolving power λ/FWHM.</param>
    /// <param name="stated">Whether the resolution is stated, not estimated.</param>
    public static double Of(Refined fit, double resolution, bool stated)
    {
        double floor = Floor(fit) / KmSPerLn, calibration = (stated ? ShareWhereStated : ShareWhereEstimated) / resolution;
        return Math.Sqrt(fit.Sigma * fit.Sigma + floor * floor + calibration * calibration);
    }

    /// <summary>
    /// Shifts within the object, km/s: broad lines of quasars against each other (Hewett &amp; Wild 2010, MNRAS 405, 2302, find scatters of
    /// some hundred km/s, and more at the highest redshifts); Lyman alpha and outflowing gas in ultraviolet galaxies (some 200 km/s, common practice).
    /// </summary>
    private static double Floor(Refined fit) => fit.Model.Kind switch
    {
        ObjectKind.Star => StarFloor(fit.Model.Template?.SpectralType ?? ""),
        ObjectKind.Nebula => 2,
        ObjectKind.Quasar => fit.LnShift > Math.Log(6) ? 500 : 180,
        _ => fit.LnShift > Math.Log(2.6) ? 180 : 12,
    };

    /// <summary>
    /// Lines as wide as those of white dwarfs, and band heads as crude as those of the coolest stars, are computed no better than to this velocity:
    /// the scatter found on simulated stars whose lines and bands have other shapes than the engine's, and about what surveys find between
    /// the velocities of cool stars' bands and of their lines (common practice).
    /// </summary>
    private static double StarFloor(string spectralType) => spectralType.Length == 0 ? 2 : spectralType[0] switch
    {
        'D' => 110,
        'M' => 45,
        'K' when spectralType.Length > 1 && spectralType[1] >= '6' => 40,
        'O' or 'B' => 20,
        _ => 2,
    };
}
