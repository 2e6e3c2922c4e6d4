using Redshift.Pipeline.Match.Fit;
using Redshift.Pipeline.Results;

namespace Redshift.Pipeline.Match.Posterior;

/// <summary>1σ of a redshift: the curvature of the likelihood, and floors for what no likelihood knows.</summary>
internal static class RedshiftError
{
    private const double KmSPerLn = 299792.458;

    /// <summary>σ of ln(1+z).</summary>
    public static double Of(Refined fit)
    {
        var floor = Floor(fit.Model.Kind) / KmSPerLn;
        return Math.Sqrt(fit.Sigma * fit.Sigma + floor * floor);
    }

    /// <summary>
    /// Wavelength calibration and template mismatch of stars and galaxies; for quasars the shifts of broad lines against each other
    /// (Hewett &amp; Wild 2010, MNRAS 405, 2302, find scatters of some hundred km/s).
    /// </summary>
    private static double Floor(ObjectKind kind) => kind switch
    {
        ObjectKind.Star => 5,
        ObjectKind.Quasar => 250,
        ObjectKind.Nebula => 8,
        _ => 15,
    };
}
