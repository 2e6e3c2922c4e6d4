using MathNet.Numerics;

namespace Redshift.Physics.Extinction;

/// <summary>
/// How strongly dust dims each wavelength. Wavelengths are rest wavelengths of the dust in vacuum, in angstrom.
/// </summary>
public static class ExtinctionCurves
{
    /// <summary>Total to selective extinction of the diffuse medium of our Galaxy, A(V)/E(B-V).</summary>
    public const double GalacticRatio = 3.1;

    /// <summary>Total to selective extinction of star-forming galaxies in the curve of Calzetti.</summary>
    public const double CalzettiRatio = 4.05;

    // a(x) and b(x) of the optical range by powers of y = x - 1.82.
    private static readonly double[] CardelliA = [1, 0.17699, -0.50447, -0.02427, 0.72085, 0.01979, -0.77530, 0.32999];
    private static readonly double[] CardelliB = [0, 1.41338, 2.28305, 1.07233, -5.38434, -0.62251, 5.30260, -2.09002];
    private static readonly double[] ODonnellA = [1, 0.104, -0.609, 0.701, 1.137, -1.718, -0.827, 1.647, -0.505];
    private static readonly double[] ODonnellB = [0, 1.952, 2.908, -3.989, -7.985, 11.102, 5.491, -10.805, 3.347];

    /// <summary>
    /// Extinction in our Galaxy relative to the visual, A(wavelength)/A(V), 1000 A to 3.33 micron.
    /// Reference: J. A. Cardelli, G. C. Clayton and J. S. Mathis, Astrophys. J. 345, 245 (1989), equations 2-5.
    /// </summary>
    /// <param name="vacuumAngstrom">Wavelength in angstrom.</param>
    /// <param name="ratio">A(V)/E(B-V).</param>
    /// <returns>A(wavelength)/A(V), 1 near 5495 A.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The wavelength is outside the range of the curve.</exception>
    public static double Cardelli(double vacuumAngstrom, double ratio = GalacticRatio)
        => Galactic(vacuumAngstrom, ratio, CardelliA, CardelliB);

    /// <summary>
    /// As <see cref="Cardelli"/>, with the optical and near-ultraviolet coefficients (3030 to 9090 A) of
    /// J. E. O'Donnell, Astrophys. J. 422, 158 (1994).
    /// </summary>
    /// <param name="vacuumAngstrom">Wavelength in angstrom.</param>
    /// <param name="ratio">A(V)/E(B-V).</param>
    /// <returns>A(wavelength)/A(V), 1 near 5495 A.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The wavelength is outside the range of the curve.</exception>
    public static double ODonnell(double vacuumAngstrom, double ratio = GalacticRatio)
        => Galactic(vacuumAngstrom, ratio, ODonnellA, ODonnellB);

    /// <summary>
    /// Attenuation of the starlight of a star-forming galaxy, k = A(wavelength)/E(B-V), 1200 A to 2.2 micron.
    /// Reference: D. Calzetti et al., Astrophys. J. 533, 682 (2000), equation 4.
    /// </summary>
    /// <param name="vacuumAngstrom">Wavelength in angstrom.</param>
    /// <returns>k, 4.05 near 5500 A. Of the reddening of the gas the stars suffer 0.44.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The wavelength is outside the range of the curve.</exception>
    public static double Calzetti(double vacuumAngstrom)
    {
        RequireRange(vacuumAngstrom, 1200, 22000);
        double x = 1e4 / vacuumAngstrom;
        double shape = vacuumAngstrom < 6300
            ? Polynomial.Evaluate(x, -2.156, 1.509, -0.198, 0.011)
            : Polynomial.Evaluate(x, -1.857, 1.040);
        return 2.659 * shape + CalzettiRatio;
    }

    private static double Galactic(double vacuumAngstrom, double ratio, double[] opticalA, double[] opticalB)
    {
        RequireRange(vacuumAngstrom, 1000, 1e4 / 0.3);
        double x = 1e4 / vacuumAngstrom;
        (double a, double b) = x switch
        {
            < 1.1 => (0.574 * Math.Pow(x, 1.61), -0.527 * Math.Pow(x, 1.61)),
            < 3.3 => (Polynomial.Evaluate(x - 1.82, opticalA), Polynomial.Evaluate(x - 1.82, opticalB)),
            < 8 => Ultraviolet(x),
            _ => FarUltraviolet(x - 8),
        };
        return a + b / ratio;
    }

    // Includes the bump at 2175 A.
    private static (double A, double B) Ultraviolet(double x)
    {
        double beyond = Math.Max(0, x - 5.9);
        double riseA = Polynomial.Evaluate(beyond, 0, 0, -0.04473, -0.009779);
        double riseB = Polynomial.Evaluate(beyond, 0, 0, 0.2130, 0.1207);
        double a = 1.752 - 0.316 * x - 0.104 / (Math.Pow(x - 4.67, 2) + 0.341) + riseA;
        double b = -3.090 + 1.825 * x + 1.206 / (Math.Pow(x - 4.62, 2) + 0.263) + riseB;
        return (a, b);
    }

    private static (double A, double B) FarUltraviolet(double beyond)
        => (Polynomial.Evaluate(beyond, -1.073, -0.628, 0.137, -0.070), Polynomial.Evaluate(beyond, 13.670, 4.257, -0.420, 0.374));

    private static void RequireRange(double vacuumAngstrom, double shortest, double longest)
    {
        if (!(vacuumAngstrom >= shortest && vacuumAngstrom <= longest))
        {
            throw new ArgumentOutOfRangeException(
                nameof(vacuumAngstrom), vacuumAngstrom, FormattableString.Invariant($"The curve runs from {shortest:F0} to {longest:F0} A."));
        }
    }
}
